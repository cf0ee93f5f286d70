import { and, asc, eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { signatures } from '@/db/schema/signatures';

export type Signature = typeof signatures.$inferSelect;

export async function insertSignature(tx: Transaction, values: typeof signatures.$inferInsert): Promise<Signature> {
  const [row] = await tx.insert(signatures).values(values).returning();
  return row!;
}

/** Every signature under one thing, in the order they were given. */
export async function listSignatures(
  db: Database | Transaction,
  subject: string,
  subjectId: string,
): Promise<Signature[]> {
  return db
    .select()
    .from(signatures)
    .where(and(eq(signatures.subject, subject), eq(signatures.subjectId, subjectId)))
    .orderBy(asc(signatures.signedAt));
}
