import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { engineerCalls } from '@/db/schema/engineer-calls';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';

export interface OpenCall {
  id: string;
  stationCode: string;
  stationName: string;
  at: Date;
  /** Null: nobody was signed in at the bench. */
  operatorNumber: string | null;
  /** Board that was in test. Null: none. */
  serial: string | null;
}

/** Calls that nobody has acknowledged, the longest waiting first. */
export function listOpenCalls(db: Database | Transaction): Promise<OpenCall[]> {
  return db
    .select({
      id: engineerCalls.id,
      stationCode: stations.code,
      stationName: stations.name,
      at: engineerCalls.at,
      operatorNumber: accounts.operatorNumber,
      serial: units.serial,
    })
    .from(engineerCalls)
    .innerJoin(stations, eq(stations.id, engineerCalls.stationId))
    .leftJoin(accounts, eq(accounts.id, engineerCalls.byAccountId))
    .leftJoin(runs, eq(runs.id, engineerCalls.runId))
    .leftJoin(units, eq(units.id, runs.unitId))
    .where(isNull(engineerCalls.acknowledgedAt))
    .orderBy(asc(engineerCalls.at));
}

/** The call with its station, when it was still open; null when someone else was first. */
export async function acknowledgeOpenCall(
  tx: Transaction,
  callId: string,
  by: { accountId: string; at: Date },
): Promise<{ stationId: string; calledAt: Date } | null> {
  const [row] = await tx
    .update(engineerCalls)
    .set({ acknowledgedBy: by.accountId, acknowledgedAt: by.at })
    .where(and(eq(engineerCalls.id, callId), isNull(engineerCalls.acknowledgedAt)))
    .returning({ stationId: engineerCalls.stationId, calledAt: engineerCalls.at });
  return row ?? null;
}
