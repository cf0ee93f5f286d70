import { and, eq, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';

/** A board of the lot that is in test now, if any. */
export async function findOpenRunOfLot(
  db: Database | Transaction,
  lotId: string,
): Promise<{ serial: string; stationCode: string } | null> {
  const [run] = await db
    .select({ serial: units.serial, stationCode: stations.code })
    .from(runs)
    .innerJoin(units, eq(units.id, runs.unitId))
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), isNull(runs.endedAt)))
    .limit(1);
  return run ?? null;
}

/** Stations that tested the lot, and when. Times null before the first run. */
export async function getLotSpan(
  db: Database | Transaction,
  lotId: string,
): Promise<{ stationCodes: string[]; firstAt: Date | null; lastAt: Date | null }> {
  const rows = await db
    .select({
      code: stations.code,
      firstAt: sql<string>`min(${runs.startedAt})`,
      lastAt: sql<string>`max(coalesce(${runs.endedAt}, ${runs.startedAt}))`,
    })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production')))
    .groupBy(stations.code)
    .orderBy(stations.code);
  const times = (name: 'firstAt' | 'lastAt') => rows.map((row) => new Date(row[name]).getTime());
  return {
    stationCodes: rows.map((row) => row.code),
    firstAt: rows.length > 0 ? new Date(Math.min(...times('firstAt'))) : null,
    lastAt: rows.length > 0 ? new Date(Math.max(...times('lastAt'))) : null,
  };
}
