import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';

export type Account = typeof accounts.$inferSelect;
export type NewAccount = typeof accounts.$inferInsert;

export async function findAccount(db: Database | Transaction, id: string): Promise<Account | null> {
  return (await db.query.accounts.findFirst({ where: eq(accounts.id, id) })) ?? null;
}

/** `email` in lower case. */
export async function findAccountByEmail(db: Database, email: string): Promise<Account | null> {
  return (await db.query.accounts.findFirst({ where: eq(accounts.email, email) })) ?? null;
}

export async function findAccountByBadge(db: Database, badgeCode: string): Promise<Account | null> {
  return (await db.query.accounts.findFirst({ where: eq(accounts.badgeCode, badgeCode) })) ?? null;
}

export async function findAccountByOperatorNumber(db: Database, number: string): Promise<Account | null> {
  return (await db.query.accounts.findFirst({ where: eq(accounts.operatorNumber, number) })) ?? null;
}

export async function insertAccount(tx: Transaction, account: NewAccount): Promise<Account> {
  const [row] = await tx.insert(accounts).values(account).returning();
  return row!;
}

export async function updateAccount(tx: Transaction, id: string, set: Partial<NewAccount>): Promise<Account | null> {
  const [row] = await tx.update(accounts).set(set).where(eq(accounts.id, id)).returning();
  return row ?? null;
}

/** How many working accounts hold the role of administrator; the last one is not taken away. */
export async function countAdministrators(tx: Transaction): Promise<number> {
  return tx.$count(accounts, and(isNull(accounts.disabledAt), sql`'administrator' = any(${accounts.roles})`));
}
