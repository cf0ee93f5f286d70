import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { simulatedBoards } from '@/db/schema/simulated-boards';
import { units } from '@/db/schema/units';

/** The first board of the lot that was never tested to a verdict and is not on a fixture. */
export async function findNextUntested(db: Database, lotId: string): Promise<string | null> {
  const rows = await db
    .select({ serial: units.serial, verdict: runs.verdict, runId: runs.id })
    .from(units)
    .leftJoin(runs, and(eq(runs.unitId, units.id), eq(runs.kind, 'production')))
    .where(and(eq(units.lotId, lotId), isNull(units.scrappedAt)))
    .orderBy(asc(units.position));
  const taken = new Set(rows.filter((row) => row.runId && row.verdict !== 'no-verdict').map((row) => row.serial));
  return rows.find((row) => !taken.has(row.serial))?.serial ?? null;
}

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
