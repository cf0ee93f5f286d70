import { and, desc, eq, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { commissionings } from '@/db/schema/commissionings';
import { dailyChecks } from '@/db/schema/daily-checks';
import { referenceBoards } from '@/db/schema/reference-boards';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import type { ReferenceCheck } from '@/lib/bench/types';

type Reader = Database | Transaction;

/** A reference board with the newest approved specification of its type. */
export async function findReferenceBoard(db: Reader, code: string) {
  const [row] = await db
    .select({ board: referenceBoards, boardType: boardTypeRevisions.specification })
    .from(referenceBoards)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.boardTypeId, referenceBoards.boardTypeId))
    .where(
      and(eq(referenceBoards.code, code), isNull(referenceBoards.retiredAt), eq(boardTypeRevisions.status, 'approved')),
    )
    .orderBy(desc(boardTypeRevisions.number))
    .limit(1);
  return row ?? null;
}

/** The newest released sequence of a board type: a daily check searches as it does. */
export async function findReleasedSequence(db: Reader, boardTypeId: string) {
  const [row] = await db
    .select({ sequence: sequenceRevisions.data, number: sequenceRevisions.number })
    .from(sequenceRevisions)
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .where(and(eq(sequences.boardTypeId, boardTypeId), eq(sequenceRevisions.status, 'released')))
    .orderBy(desc(sequenceRevisions.releasedAt))
    .limit(1);
  return row ?? null;
}

export async function insertCommissioning(db: Database, row: typeof commissionings.$inferInsert): Promise<void> {
  await db.insert(commissionings).values(row);
}

export async function insertDailyCheck(tx: Transaction, row: typeof dailyChecks.$inferInsert): Promise<void> {
  await tx.insert(dailyChecks).values(row);
}

/** The known points of a reference board. Volts. */
export async function getReferencePoints(tx: Transaction, id: string): Promise<ReferenceCheck> {
  const [row] = await tx
    .select({
      referenceCode: referenceBoards.code,
      tripVolts: referenceBoards.tripVolts,
      releaseVolts: referenceBoards.releaseVolts,
      toleranceVolts: referenceBoards.toleranceVolts,
    })
    .from(referenceBoards)
    .where(eq(referenceBoards.id, id));
  if (!row) throw new Error(`There is no reference board ${id}.`);
  return row;
}
