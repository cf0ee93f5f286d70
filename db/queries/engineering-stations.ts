import { and, desc, eq, gt, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sessions } from '@/db/schema/sessions';
import { units } from '@/db/schema/units';

export interface NewestRun {
  stationId: string;
  kind: (typeof runs.$inferSelect)['kind'];
  serial: string | null;
  lotId: string | null;
  lotCode: string | null;
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
      serial: units.serial,
      lotId: runs.lotId,
      lotCode: lots.code,
      startedAt: runs.startedAt,
      endedAt: runs.endedAt,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      binScannedAt: runs.binScannedAt,
      operatorNumber: accounts.operatorNumber,
    })
    .from(runs)
    .leftJoin(units, eq(units.id, runs.unitId))
    .leftJoin(lots, eq(lots.id, runs.lotId))
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .orderBy(runs.stationId, desc(runs.startedAt));
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
