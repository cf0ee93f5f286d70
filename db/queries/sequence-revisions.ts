import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import type { BoardType } from '@/lib/contracts/board-type';

type Reader = Database | Transaction;
export type SequenceRevision = typeof sequenceRevisions.$inferSelect;
export type NewSequenceRevision = typeof sequenceRevisions.$inferInsert;

export interface SequenceRow {
  id: string;
  name: string;
  boardTypeId: string;
  boardTypeCode: string;
}

export async function findSequence(db: Reader, sequenceId: string): Promise<SequenceRow | null> {
  const [row] = await db
    .select({ id: sequences.id, name: sequences.name, boardTypeId: boardTypes.id, boardTypeCode: boardTypes.code })
    .from(sequences)
    .innerJoin(boardTypes, eq(boardTypes.id, sequences.boardTypeId))
    .where(eq(sequences.id, sequenceId));
  return row ?? null;
}

/** What a board type is for its sequences: the newest approved specification, or the newest of all while none is approved. */
export async function getSpecification(db: Reader, boardTypeId: string): Promise<BoardType> {
  const [row] = await db
    .select({ specification: boardTypeRevisions.specification })
    .from(boardTypeRevisions)
    .where(eq(boardTypeRevisions.boardTypeId, boardTypeId))
    .orderBy(desc(sql`${boardTypeRevisions.status} = 'approved'`), desc(boardTypeRevisions.number))
    .limit(1);
  if (!row) throw new Error(`Board type ${boardTypeId} has no revision.`);
  return row.specification;
}

/** A row with the sequence it belongs to, locked until the transaction ends. */
export async function findRevisionForUpdate(tx: Transaction, revisionId: string): Promise<SequenceRevision | null> {
  const [row] = await tx.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, revisionId)).for('update');
  return row ?? null;
}

export async function findRevision(db: Reader, revisionId: string): Promise<SequenceRevision | null> {
  const [row] = await db.select().from(sequenceRevisions).where(eq(sequenceRevisions.id, revisionId));
  return row ?? null;
}

/** The draft or the submitted revision; there is at most one. */
export async function findStandingDraft(db: Reader, sequenceId: string): Promise<SequenceRevision | null> {
  const [row] = await db
    .select()
    .from(sequenceRevisions)
    .where(
      and(eq(sequenceRevisions.sequenceId, sequenceId), inArray(sequenceRevisions.status, ['draft', 'submitted'])),
    );
  return row ?? null;
}

/** The revision in use: released and not superseded. */
export async function findReleasedOf(db: Reader, sequenceId: string): Promise<SequenceRevision | null> {
  const [row] = await db
    .select()
    .from(sequenceRevisions)
    .where(and(eq(sequenceRevisions.sequenceId, sequenceId), eq(sequenceRevisions.status, 'released')))
    .orderBy(desc(sequenceRevisions.number))
    .limit(1);
  return row ?? null;
}

/** Every revision of a sequence, newest first. */
export async function listRevisions(db: Reader, sequenceId: string): Promise<SequenceRevision[]> {
  return db
    .select()
    .from(sequenceRevisions)
    .where(eq(sequenceRevisions.sequenceId, sequenceId))
    .orderBy(desc(sequenceRevisions.number));
}

/** Names by account id. */
export async function listNames(db: Reader, accountIds: readonly string[]): Promise<Map<string, string>> {
  if (accountIds.length === 0) return new Map();
  const rows = await db
    .select({ id: accounts.id, name: accounts.name })
    .from(accounts)
    .where(inArray(accounts.id, [...accountIds]));
  return new Map(rows.map(({ id, name }) => [id, name]));
}

/** Drafts only: a trigger refuses everything that was ever released. */
export async function deleteDraft(tx: Transaction, revisionId: string): Promise<void> {
  await tx.delete(sequenceRevisions).where(eq(sequenceRevisions.id, revisionId));
}

export async function findBoardTypeByCode(db: Reader, code: string): Promise<{ id: string; code: string } | null> {
  const [row] = await db
    .select({ id: boardTypes.id, code: boardTypes.code })
    .from(boardTypes)
    .where(eq(boardTypes.code, code));
  return row ?? null;
}

export async function listBoardTypeCodes(db: Reader): Promise<{ code: string; name: string }[]> {
  return db.select({ code: boardTypes.code, name: boardTypes.name }).from(boardTypes).orderBy(asc(boardTypes.code));
}
