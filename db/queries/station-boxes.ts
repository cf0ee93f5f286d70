import { and, desc, eq } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { simulatedBoards } from '@/db/schema/simulated-boards';
import { units } from '@/db/schema/units';

/** How the simulated board of a serial is made; `seed` null: nobody said, so its serial decides. */
export async function findSimulatedBoard(db: Database, serial: string) {
  const [row] = await db
    .select({
      boardType: boardTypeRevisions.specification,
      sequence: sequenceRevisions.data,
      seed: simulatedBoards.seed,
      defect: simulatedBoards.defect,
    })
    .from(units)
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lots.sequenceRevisionId))
    .leftJoin(simulatedBoards, eq(simulatedBoards.serial, units.serial))
    .where(eq(units.serial, serial));
  return row ?? null;
}

/** Ids of the open lots of a board type, newest first. */
export async function listOpenLotsOfType(db: Database, boardTypeId: string): Promise<string[]> {
  const rows = await db
    .select({ id: lots.id })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(and(eq(boardTypeRevisions.boardTypeId, boardTypeId), eq(lots.state, 'open')))
    .orderBy(desc(lots.createdAt));
  return rows.map(({ id }) => id);
}
