import { and, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accountLinks } from '@/db/schema/account-links';

export type AccountLinkKind = (typeof accountLinks.$inferSelect)['kind'];

/** Makes a link and spends those made before for the same purpose, so that only the newest works. */
export async function insertAccountLink(
  tx: Transaction,
  link: { kind: AccountLinkKind; tokenHash: string; accountId: string | null; hours: number },
): Promise<void> {
  const { hours, ...row } = link;
  await tx
    .update(accountLinks)
    .set({ usedAt: sql`now()` })
    .where(
      and(
        eq(accountLinks.kind, row.kind),
        row.accountId ? eq(accountLinks.accountId, row.accountId) : isNull(accountLinks.accountId),
        isNull(accountLinks.usedAt),
      ),
    );
  await tx.insert(accountLinks).values({ ...row, expiresAt: sql`now() + make_interval(hours => ${hours})` });
}

const usable = (kind: AccountLinkKind, tokenHash: string) =>
  and(
    eq(accountLinks.kind, kind),
    eq(accountLinks.tokenHash, tokenHash),
    isNull(accountLinks.usedAt),
    gt(accountLinks.expiresAt, sql`now()`),
  );

/** Whether the link still works; showing its page does not spend it. */
export async function accountLinkWorks(db: Database, kind: AccountLinkKind, tokenHash: string): Promise<boolean> {
  return (await db.$count(accountLinks, usable(kind, tokenHash))) === 1;
}

/** Spends the link: at most one caller gets it. Null when it does not work. */
export async function spendAccountLink(
  tx: Transaction,
  kind: AccountLinkKind,
  tokenHash: string,
): Promise<{ accountId: string | null } | null> {
  const [row] = await tx
    .update(accountLinks)
    .set({ usedAt: sql`now()` })
    .where(usable(kind, tokenHash))
    .returning({ accountId: accountLinks.accountId });
  return row ?? null;
}
