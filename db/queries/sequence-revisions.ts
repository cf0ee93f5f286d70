import { and, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';

type Reader = Database | Transaction;

export type SequenceRevision = typeof sequenceRevisions.$inferSelect;
export type NewSequenceRevision = typeof sequenceRevisions.$inferInsert;

/** A sequence with its board type, and the specification it is checked against: the newest approved, or the newest where none is. */
export async function findSequence(db: Reader, sequenceId: string) {
  const [row] = await db
    .select({
      id: sequences.id,
      name: sequences.name,
      boardTypeId: boardTypes.id,
      boardTypeCode: boardTypes.code,
      boardType: boardTypeRevisions.specification,
    })
    .from(sequences)
    .innerJoin(boardTypes, eq(boardTypes.id, sequences.boardTypeId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.boardTypeId, sequences.boardTypeId))
    .where(eq(sequences.id, sequenceId))
    .orderBy(sql`${boardTypeRevisions.status} = 'approved' desc`, desc(boardTypeRevisions.number))
    .limit(1);
  return row ?? null;
}

/** Newest first. */
export function listRevisions(db: Reader, sequenceId: string): Promise<SequenceRevision[]> {
  return db
    .select()
    .from(sequenceRevisions)
    .where(eq(sequenceRevisions.sequenceId, sequenceId))
    .orderBy(desc(sequenceRevisions.number));
}

export async function findRevision(db: Reader, revisionId: string): Promise<SequenceRevision | null> {
  const [row] = await db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, revisionId));
  return row ?? null;
}

/** The row, locked until the transaction ends. */
export async function findRevisionForUpdate(tx: Transaction, revisionId: string): Promise<SequenceRevision | null> {
  const [row] = await tx.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, revisionId)).for('update');
  return row ?? null;
}

/** The draft of a sequence, or what waits for its release. */
export async function findStandingDraft(db: Reader, sequenceId: string): Promise<SequenceRevision | null> {
  const standing = inArray(sequenceRevisions.status, ['draft', 'submitted']);
  const [row] = await db
    .select()
    .from(sequenceRevisions)
    .where(and(eq(sequenceRevisions.sequenceId, sequenceId), standing));
  return row ?? null;
}

/** The revision in use. */
export async function findReleased(db: Reader, sequenceId: string): Promise<SequenceRevision | null> {
  const [row] = await db
    .select()
    .from(sequenceRevisions)
    .where(and(eq(sequenceRevisions.sequenceId, sequenceId), eq(sequenceRevisions.status, 'released')))
    .orderBy(desc(sequenceRevisions.number))
    .limit(1);
  return row ?? null;
}

/** Names of accounts, by id. */
export async function listNames(db: Reader, accountIds: readonly string[]): Promise<Map<string, string>> {
  if (accountIds.length === 0) return new Map();
  const rows = await db
    .select({ id: accounts.id, name: accounts.name })
    .from(accounts)
    .where(inArray(accounts.id, [...new Set(accountIds)]));
  return new Map(rows.map(({ id, name }) => [id, name]));
}
