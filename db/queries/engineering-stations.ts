import { and, desc, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { runs } from '@/db/schema/runs';
import { sessions } from '@/db/schema/sessions';

export interface NewestRun {
  stationId: string;
  kind: (typeof runs.$inferSelect)['kind'];
  /** As planned: a spare board and a reference board are no units. */
  serial: string;
  startedAt: Date;
  endedAt: Date | null;
  verdict: (typeof runs.$inferSelect)['verdict'];
  rejectReason: (typeof runs.$inferSelect)['rejectReason'];
  binScannedAt: Date | null;
  operatorNumber: string | null;
}

/** The newest run of every station, open or ended. */
export function listNewestRunsOfStations(db: Database | Transaction): Promise<NewestRun[]> {
  return db
    .selectDistinctOn([runs.stationId], {
      stationId: runs.stationId,
      kind: runs.kind,
      serial: sql<string>`${runs.plan} ->> 'serial'`,
      startedAt: runs.startedAt,
      endedAt: runs.endedAt,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      binScannedAt: runs.binScannedAt,
      operatorNumber: accounts.operatorNumber,
    })
    .from(runs)
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .orderBy(runs.stationId, desc(runs.startedAt));
}

/** The lot of the newest production run of every station. Keys and values are ids. */
export async function listLotsOfStations(db: Database | Transaction): Promise<Map<string, string>> {
  const rows = await db
    .selectDistinctOn([runs.stationId], { stationId: runs.stationId, lotId: runs.lotId })
    .from(runs)
    .where(eq(runs.kind, 'production'))
    .orderBy(runs.stationId, desc(runs.startedAt));
  return new Map(rows.map(({ stationId, lotId }) => [stationId, lotId!]));
}

export interface SignedInOperator {
  stationId: string;
  operatorNumber: string | null;
  since: Date;
}

/** Whoever is signed in at a bench now. */
export async function listSignedInOperators(db: Database | Transaction): Promise<SignedInOperator[]> {
  const rows = await db
    .select({ stationId: sessions.stationId, operatorNumber: accounts.operatorNumber, since: sessions.createdAt })
    .from(sessions)
    .innerJoin(accounts, eq(accounts.id, sessions.accountId))
    .where(and(eq(sessions.kind, 'bench'), isNull(sessions.endedAt), gt(sessions.expiresAt, sql`now()`)));
  return rows.map((row) => ({ ...row, stationId: row.stationId! }));
}
