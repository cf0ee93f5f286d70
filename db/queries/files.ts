import { eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { files } from '@/db/schema/files';

export type StoredFile = typeof files.$inferSelect;

export async function findFile(db: Database | Transaction, id: string): Promise<StoredFile | null> {
  const [file] = await db.select().from(files).where(eq(files.id, id));
  return file ?? null;
}

export async function insertFile(tx: Transaction, values: typeof files.$inferInsert): Promise<{ id: string }> {
  const [file] = await tx.insert(files).values(values).returning({ id: files.id });
  return file!;
}
