import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { reasonCodes } from '@/db/schema/reason-codes';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';

type Reader = Database | Transaction;
export type ReasonCode = typeof reasonCodes.$inferSelect;

/** Codes that may be chosen, by word. */
export function listActiveReasonCodes(db: Reader): Promise<Pick<ReasonCode, 'id' | 'use' | 'word'>[]> {
  return db
    .select({ id: reasonCodes.id, use: reasonCodes.use, word: reasonCodes.word })
    .from(reasonCodes)
    .where(isNull(reasonCodes.retiredAt))
    .orderBy(asc(reasonCodes.word));
}

/** Every code with who made it, what it was merged into and how many decisions name it under its own word. */
export function listReasonCodes(db: Reader) {
  return db
    .select({
      code: reasonCodes,
      createdByName: accounts.name,
      mergedInto: sql<string | null>`(select m.word from reason_codes m where m.id = ${reasonCodes.mergedIntoId})`,
      used: sql<number>`(select count(*)::int from dispositions d where d.reason_code_id = ${reasonCodes.id})`,
    })
    .from(reasonCodes)
    .innerJoin(accounts, eq(accounts.id, reasonCodes.createdBy))
    .orderBy(asc(reasonCodes.use), asc(reasonCodes.word));
}

export async function findReasonCode(db: Reader, id: string): Promise<ReasonCode | null> {
  const [row] = await db.select().from(reasonCodes).where(eq(reasonCodes.id, id));
  return row ?? null;
}

/** The row, locked until the transaction ends. */
export async function findReasonCodeForUpdate(tx: Transaction, id: string): Promise<ReasonCode | null> {
  const [row] = await tx.select().from(reasonCodes).where(eq(reasonCodes.id, id)).for('update');
  return row ?? null;
}

/** The same word in other letters counts as the same. */
export async function findReasonCodeByWord(db: Reader, use: ReasonCodeUse, word: string): Promise<ReasonCode | null> {
  const [row] = await db
    .select()
    .from(reasonCodes)
    .where(and(eq(reasonCodes.use, use), sql`lower(${reasonCodes.word}) = lower(${word})`));
  return row ?? null;
}

export async function insertReasonCode(
  tx: Transaction,
  values: typeof reasonCodes.$inferInsert,
): Promise<{ id: string }> {
  const [row] = await tx.insert(reasonCodes).values(values).returning({ id: reasonCodes.id });
  return row!;
}

export async function updateReasonCode(
  tx: Transaction,
  id: string,
  change: Pick<Partial<ReasonCode>, 'retiredAt' | 'mergedIntoId'>,
): Promise<void> {
  await tx.update(reasonCodes).set(change).where(eq(reasonCodes.id, id));
}

/** What was merged into one reason now counts as another. */
export async function updateMergedInto(tx: Transaction, fromId: string, toId: string): Promise<void> {
  await tx.update(reasonCodes).set({ mergedIntoId: toId }).where(eq(reasonCodes.mergedIntoId, fromId));
}
