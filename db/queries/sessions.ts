import { and, eq, gt, inArray, isNull, lt, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { sessions } from '@/db/schema/sessions';
import { stations } from '@/db/schema/stations';
import type { Actor } from '@/lib/access/actor';

/** Longest life of a session, whatever is done in it: a shift with its handover. */
const sessionHours = 12;
/** `lastSeenAt` is written at most this often. */
const seenEverySeconds = 60;

const isOpen = and(isNull(sessions.endedAt), gt(sessions.expiresAt, sql`now()`));

/** Whoever the session is of, or null when it ended, expired, or its account or station is no longer in use. */
export async function findActor(db: Database, sessionId: string): Promise<Actor | null> {
  const [row] = await db
    .select({
      sessionId: sessions.id,
      sessionKind: sessions.kind,
      accountId: accounts.id,
      name: accounts.name,
      operatorNumber: accounts.operatorNumber,
      roles: accounts.roles,
      locale: accounts.locale,
      stationId: sessions.stationId,
      seenLongAgo: sql<boolean>`${sessions.lastSeenAt} < now() - make_interval(secs => ${seenEverySeconds})`,
    })
    .from(sessions)
    .innerJoin(accounts, eq(accounts.id, sessions.accountId))
    .leftJoin(stations, eq(stations.id, sessions.stationId))
    .where(and(eq(sessions.id, sessionId), isOpen, isNull(accounts.disabledAt), isNull(stations.retiredAt)));
  if (!row) return null;
  const { seenLongAgo, ...actor } = row;
  if (seenLongAgo)
    await db
      .update(sessions)
      .set({ lastSeenAt: sql`now()` })
      .where(eq(sessions.id, sessionId));
  return actor;
}

/** Those of the given sessions that still hold. */
export async function listOpenSessions(db: Database, ids: readonly string[]): Promise<string[]> {
  if (ids.length === 0) return [];
  const rows = await db
    .select({ id: sessions.id })
    .from(sessions)
    .where(and(inArray(sessions.id, [...ids]), isOpen));
  return rows.map((row) => row.id);
}

export async function insertSession(
  tx: Transaction | Database,
  session: { accountId: string; stationId: string | null },
): Promise<string> {
  const [row] = await tx
    .insert(sessions)
    .values({
      ...session,
      kind: session.stationId ? 'bench' : 'desk',
      expiresAt: sql`now() + make_interval(hours => ${sessionHours})`,
    })
    .returning({ id: sessions.id });
  return row!.id;
}

export type EndedBecause = 'signed-out' | 'replaced' | 'password-changed' | 'locked' | 'shift-ended' | 'expired';

/** Ends one session; nothing happens when it has ended before. */
export async function endSession(tx: Transaction | Database, id: string, because: EndedBecause): Promise<void> {
  await tx
    .update(sessions)
    .set({ endedAt: sql`now()`, endedBecause: because })
    .where(and(eq(sessions.id, id), isNull(sessions.endedAt)));
}

/** One person at a bench: whoever signs in there ends the session before. */
export async function endSessionsAtStation(tx: Transaction | Database, stationId: string): Promise<void> {
  await tx
    .update(sessions)
    .set({ endedAt: sql`now()`, endedBecause: 'replaced' })
    .where(and(eq(sessions.stationId, stationId), isNull(sessions.endedAt)));
}

export async function endSessionsOfAccount(
  tx: Transaction | Database,
  accountId: string,
  because: EndedBecause,
): Promise<void> {
  await tx
    .update(sessions)
    .set({ endedAt: sql`now()`, endedBecause: because })
    .where(and(eq(sessions.accountId, accountId), isNull(sessions.endedAt)));
}

/** Marks sessions that outlived their hours as ended, which also tells whoever holds a socket of theirs. */
export async function endExpiredSessions(db: Database): Promise<void> {
  await db
    .update(sessions)
    .set({ endedAt: sql`now()`, endedBecause: 'expired' })
    .where(and(isNull(sessions.endedAt), lt(sessions.expiresAt, sql`now()`)));
}
