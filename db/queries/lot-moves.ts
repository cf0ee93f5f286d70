import { desc, eq, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { lotMoves } from '@/db/schema/lot-moves';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';

type Reader = Database | Transaction;

export async function insertLotMove(tx: Transaction, move: typeof lotMoves.$inferInsert): Promise<void> {
  await tx.insert(lotMoves).values(move);
}

/** Revisions that a lot was moved from and to, newest first. */
export function listLotMoves(db: Reader, lotId: string) {
  const to = alias(sequenceRevisions, 'to_revision');
  return db
    .select({
      id: lotMoves.id,
      fromNumber: sequenceRevisions.number,
      toNumber: to.number,
      reason: lotMoves.reason,
      movedByName: accounts.name,
      movedAt: lotMoves.movedAt,
    })
    .from(lotMoves)
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lotMoves.fromRevisionId))
    .innerJoin(to, eq(to.id, lotMoves.toRevisionId))
    .innerJoin(accounts, eq(accounts.id, lotMoves.movedBy))
    .where(eq(lotMoves.lotId, lotId))
    .orderBy(desc(lotMoves.movedAt));
}

/** The revision that a lot pins, and the one in use of the same sequence where that is a newer one. */
export async function getLotRevision(db: Reader, sequenceRevisionId: string) {
  const newer = alias(sequenceRevisions, 'newer');
  const isNewer = sql`${newer.sequenceId} = ${sequenceRevisions.sequenceId} and ${newer.status} = 'released' and ${newer.number} > ${sequenceRevisions.number}`;
  const [row] = await db
    .select({
      sequenceId: sequenceRevisions.sequenceId,
      status: sequenceRevisions.status,
      withdrawnReason: sequenceRevisions.withdrawnReason,
      newerId: newer.id,
      newerNumber: newer.number,
    })
    .from(sequenceRevisions)
    .leftJoin(newer, isNewer)
    .where(eq(sequenceRevisions.id, sequenceRevisionId))
    .orderBy(desc(newer.number))
    .limit(1);
  return row!;
}
