import { and, asc, count, desc, eq, inArray, max, ne } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';

type Reader = Database | Transaction;
export type BoardTypeRevision = typeof boardTypeRevisions.$inferSelect;
type NewRevision = Omit<typeof boardTypeRevisions.$inferInsert, 'number'>;

export async function findBoardType(db: Reader, code: string): Promise<typeof boardTypes.$inferSelect | null> {
  const [row] = await db.select().from(boardTypes).where(eq(boardTypes.code, code));
  return row ?? null;
}

export async function listBoardTypeCodes(db: Reader): Promise<string[]> {
  const rows = await db.select({ code: boardTypes.code }).from(boardTypes).orderBy(asc(boardTypes.code));
  return rows.map(({ code }) => code);
}

export async function insertBoardType(
  tx: Transaction,
  values: typeof boardTypes.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(boardTypes).values(values).returning({ id: boardTypes.id });
  return row!;
}

/** The name that lists show follows the approved specification. */
export async function updateBoardTypeName(tx: Transaction, boardTypeId: string, name: string): Promise<void> {
  await tx.update(boardTypes).set({ name }).where(eq(boardTypes.id, boardTypeId));
}

const submitters = alias(accounts, 'submitters');
const senders = alias(accounts, 'senders');
const approvers = alias(accounts, 'approvers');

/** All revisions of a board type with the names of those who acted, newest first. */
export async function listBoardTypeRevisions(db: Reader, boardTypeId: string) {
  return db
    .select({
      revision: boardTypeRevisions,
      madeByName: accounts.name,
      submittedByName: submitters.name,
      sentBackByName: senders.name,
      approvedByName: approvers.name,
    })
    .from(boardTypeRevisions)
    .innerJoin(accounts, eq(accounts.id, boardTypeRevisions.madeBy))
    .leftJoin(submitters, eq(submitters.id, boardTypeRevisions.submittedBy))
    .leftJoin(senders, eq(senders.id, boardTypeRevisions.sentBackBy))
    .leftJoin(approvers, eq(approvers.id, boardTypeRevisions.approvedBy))
    .where(eq(boardTypeRevisions.boardTypeId, boardTypeId))
    .orderBy(desc(boardTypeRevisions.number));
}

/** Every board type with its revisions, oldest code first and newest revision first. */
export async function listAllBoardTypeRevisions(db: Reader) {
  return db
    .select({ code: boardTypes.code, revision: boardTypeRevisions, madeByName: accounts.name })
    .from(boardTypeRevisions)
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(accounts, eq(accounts.id, boardTypeRevisions.madeBy))
    .orderBy(asc(boardTypes.code), desc(boardTypeRevisions.number));
}

/** Lots by board type, with how many of them are not closed. */
export async function countLotsByBoardType(db: Reader): Promise<Map<string, { all: number; open: number }>> {
  const rows = await db
    .select({ boardTypeId: boardTypeRevisions.boardTypeId, state: lots.state, lots: count() })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .groupBy(boardTypeRevisions.boardTypeId, lots.state);
  const counted = new Map<string, { all: number; open: number }>();
  for (const row of rows) {
    const sum = counted.get(row.boardTypeId) ?? { all: 0, open: 0 };
    counted.set(row.boardTypeId, {
      all: sum.all + row.lots,
      open: sum.open + (row.state === 'closed' ? 0 : row.lots),
    });
  }
  return counted;
}

/** Lots that are not closed, with the revision that they keep. */
export async function listOpenLotsOfBoardType(db: Reader, boardTypeId: string) {
  return db
    .select({ code: lots.code, revisionNumber: boardTypeRevisions.number })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(and(eq(boardTypeRevisions.boardTypeId, boardTypeId), ne(lots.state, 'closed')))
    .orderBy(asc(lots.code));
}

/** Sequences of a board type that are in use. */
export async function listReleasedSequences(db: Reader, boardTypeId: string) {
  return db
    .select({
      sequenceId: sequences.id,
      name: sequences.name,
      number: sequenceRevisions.number,
      sequence: sequenceRevisions.data,
    })
    .from(sequenceRevisions)
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .where(and(eq(sequences.boardTypeId, boardTypeId), eq(sequenceRevisions.status, 'released')))
    .orderBy(asc(sequences.name));
}

/** Locked until the transaction ends. */
export async function findBoardTypeRevisionForUpdate(tx: Transaction, id: string): Promise<BoardTypeRevision | null> {
  const [row] = await tx.select().from(boardTypeRevisions).where(eq(boardTypeRevisions.id, id)).for('update');
  return row ?? null;
}

/** The revision that new lots take, or null. */
export async function findApprovedRevision(db: Reader, boardTypeId: string): Promise<BoardTypeRevision | null> {
  const [row] = await db
    .select()
    .from(boardTypeRevisions)
    .where(and(eq(boardTypeRevisions.boardTypeId, boardTypeId), eq(boardTypeRevisions.status, 'approved')))
    .orderBy(desc(boardTypeRevisions.number))
    .limit(1);
  return row ?? null;
}

/** The draft or what waits for approval; a board type has one at most. */
export async function findStandingBoardTypeDraft(db: Reader, boardTypeId: string): Promise<BoardTypeRevision | null> {
  const [row] = await db
    .select()
    .from(boardTypeRevisions)
    .where(
      and(eq(boardTypeRevisions.boardTypeId, boardTypeId), inArray(boardTypeRevisions.status, ['draft', 'submitted'])),
    );
  return row ?? null;
}

/** Takes the next number of its board type. */
export async function insertBoardTypeDraft(tx: Transaction, values: NewRevision): Promise<BoardTypeRevision> {
  const [last] = await tx
    .select({ number: max(boardTypeRevisions.number) })
    .from(boardTypeRevisions)
    .where(eq(boardTypeRevisions.boardTypeId, values.boardTypeId));
  const [row] = await tx
    .insert(boardTypeRevisions)
    .values({ ...values, number: (last?.number ?? 0) + 1 })
    .returning();
  return row!;
}

export async function updateBoardTypeRevision(
  tx: Transaction,
  id: string,
  change: Partial<typeof boardTypeRevisions.$inferInsert>,
): Promise<void> {
  await tx.update(boardTypeRevisions).set(change).where(eq(boardTypeRevisions.id, id));
}
