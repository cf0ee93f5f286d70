import { and, asc, eq, isNull, max, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { sessions } from '@/db/schema/sessions';
import { trainings } from '@/db/schema/trainings';

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

/**
 * Ids of the working accounts with the role of administrator, locked until the transaction ends: two administrators cannot
 * take the role from each other at the same moment.
 */
export async function lockAdministrators(tx: Transaction): Promise<string[]> {
  const rows = await tx
    .select({ id: accounts.id })
    .from(accounts)
    .where(and(isNull(accounts.disabledAt), sql`'administrator' = any(${accounts.roles})`))
    .for('update');
  return rows.map((row) => row.id);
}

/** One account with what the list of people shows beside it. */
export interface PersonRow extends Pick<
  Account,
  'id' | 'name' | 'email' | 'operatorNumber' | 'badgeCode' | 'roles' | 'locale' | 'createdAt' | 'disabledAt'
> {
  hasPassword: boolean;
  hasPin: boolean;
  /** Null: never signed in. */
  lastSeenAt: Date | null;
  /** The first of the board types' trainings to end, each by its latest record. Null: trained for none. */
  trainedUntil: Date | null;
}

export async function listPeople(db: Database): Promise<PersonRow[]> {
  const lastSeen = db
    .select({ accountId: sessions.accountId, at: max(sessions.lastSeenAt).as('last_seen') })
    .from(sessions)
    .groupBy(sessions.accountId)
    .as('last_seen_of');
  const latest = db
    .select({ accountId: trainings.accountId, until: max(trainings.validUntil).as('latest') })
    .from(trainings)
    .groupBy(trainings.accountId, trainings.boardTypeId)
    .as('latest_of');
  const trained = db
    .select({
      accountId: latest.accountId,
      until: sql`min(${latest.until})`.mapWith(trainings.validUntil).as('trained_until'),
    })
    .from(latest)
    .groupBy(latest.accountId)
    .as('trained_of');
  return db
    .select({
      id: accounts.id,
      name: accounts.name,
      email: accounts.email,
      operatorNumber: accounts.operatorNumber,
      badgeCode: accounts.badgeCode,
      roles: accounts.roles,
      locale: accounts.locale,
      createdAt: accounts.createdAt,
      disabledAt: accounts.disabledAt,
      hasPassword: sql<boolean>`${accounts.passwordHash} is not null`,
      hasPin: sql<boolean>`${accounts.pinHash} is not null`,
      lastSeenAt: lastSeen.at,
      trainedUntil: trained.until,
    })
    .from(accounts)
    .leftJoin(lastSeen, eq(lastSeen.accountId, accounts.id))
    .leftJoin(trained, eq(trained.accountId, accounts.id))
    .orderBy(asc(accounts.name));
}

/** Some working administrator; null before the first one is made. */
export async function findAdministrator(db: Database): Promise<Account | null> {
  const working = and(isNull(accounts.disabledAt), sql`'administrator' = any(${accounts.roles})`);
  return (await db.query.accounts.findFirst({ where: working, orderBy: accounts.createdAt })) ?? null;
}
