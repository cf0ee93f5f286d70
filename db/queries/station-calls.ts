import { and, desc, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { engineerCalls } from '@/db/schema/engineer-calls';
import { runs } from '@/db/schema/runs';

export interface StationCall {
  id: string;
  at: Date;
  acknowledgedByName: string | null;
}

/** The open call, or one acknowledged less than ten minutes ago; null when nobody is called. */
export async function findStationCall(db: Database | Transaction, stationId: string): Promise<StationCall | null> {
  const [row] = await db
    .select({ id: engineerCalls.id, at: engineerCalls.at, acknowledgedByName: accounts.name })
    .from(engineerCalls)
    .leftJoin(accounts, eq(accounts.id, engineerCalls.acknowledgedBy))
    .where(
      and(
        eq(engineerCalls.stationId, stationId),
        sql`(${engineerCalls.acknowledgedAt} is null or ${engineerCalls.acknowledgedAt} > now() - interval '10 minutes')`,
      ),
    )
    .orderBy(desc(engineerCalls.at))
    .limit(1);
  return row ?? null;
}

/** A second call while one is open changes nothing. */
export async function insertStationCall(
  db: Database,
  call: { stationId: string; byAccountId: string | null },
): Promise<void> {
  const [open] = await db
    .select({ id: runs.id })
    .from(runs)
    .where(and(eq(runs.stationId, call.stationId), isNull(runs.endedAt)));
  await db
    .insert(engineerCalls)
    .values({ ...call, runId: open?.id ?? null })
    .onConflictDoNothing();
}
