import { eq } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { siteSettings } from '@/db/schema/site-settings';

/** The stored value of a setting, to be parsed by its schema; null: never set. */
export async function findSiteSetting(db: Database | Transaction, key: string): Promise<unknown> {
  const [row] = await db.select({ value: siteSettings.value }).from(siteSettings).where(eq(siteSettings.key, key));
  return row?.value ?? null;
}
