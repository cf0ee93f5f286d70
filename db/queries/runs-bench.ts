import { and, asc, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { labels } from '@/db/schema/labels';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { units } from '@/db/schema/units';

type Reader = Database | Transaction;

/** The station's newest production run, when it is a reject whose bin has not been scanned. */
export async function findRunAwaitingBin(
  db: Reader,
  stationId: string,
): Promise<{ runId: string; serial: string } | null> {
  const [newest] = await db
    .select({ runId: runs.id, serial: units.serial, verdict: runs.verdict, binScannedAt: runs.binScannedAt })
    .from(runs)
    .innerJoin(units, eq(units.id, runs.unitId))
    .where(and(eq(runs.stationId, stationId), eq(runs.kind, 'production')))
    .orderBy(desc(runs.startedAt))
    .limit(1);
  return newest?.verdict === 'reject' && !newest.binScannedAt ? { runId: newest.runId, serial: newest.serial } : null;
}

/** The one change that a closed run takes, once. */
export async function setBinScan(db: Reader, runId: string, binCode: string, at: Date): Promise<void> {
  await db
    .update(runs)
    .set({ binCode, binScannedAt: at })
    .where(and(eq(runs.id, runId), isNull(runs.binScannedAt), eq(runs.verdict, 'reject')));
}

/** Typical seconds of a board of the lot: the median of its production runs with a verdict; null before three of them. */
export async function findSecondsEach(db: Reader, lotId: string): Promise<number | null> {
  const [row] = await db
    .select({
      median: sql<number | null>`percentile_cont(0.5) within group (order by ${runs.seconds})`,
      count: sql<number>`count(${runs.seconds})::int`,
    })
    .from(runs)
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), inArray(runs.verdict, ['pass', 'reject'])));
  return row && row.count >= 3 ? row.median : null;
}

/** Points as found before any trim, newest production runs first, of boards of the lot that have a verdict. Volts. */
export async function listFoundPoints(
  db: Reader,
  lotId: string,
  most: number,
): Promise<{ tripVolts: number; hysteresisVolts: number }[]> {
  const rows = await db
    .select({ runId: runs.id, quantity: measurements.quantity, value: measurements.value })
    .from(measurements)
    .innerJoin(runs, eq(runs.id, measurements.runId))
    .where(
      and(
        eq(runs.lotId, lotId),
        eq(runs.kind, 'production'),
        eq(runs.attempt, 1),
        inArray(runs.verdict, ['pass', 'reject']),
        eq(measurements.phase, 'found'),
        inArray(measurements.quantity, ['trip-volts', 'hysteresis-volts']),
      ),
    )
    .orderBy(desc(runs.startedAt), asc(measurements.n))
    .limit(most * 2);
  const values = new Map(rows.map((row) => [`${row.runId} ${row.quantity}`, row.value]));
  return [...new Set(rows.map((row) => row.runId))].flatMap((runId) => {
    const tripVolts = values.get(`${runId} trip-volts`);
    const hysteresisVolts = values.get(`${runId} hysteresis-volts`);
    return tripVolts === undefined || hysteresisVolts === undefined ? [] : [{ tripVolts, hysteresisVolts }];
  });
}

/** The newest label of a board; null when none was asked for. */
export async function findNewestLabel(db: Reader, serial: string) {
  const [row] = await db
    .select({ runId: labels.runId, unitId: labels.unitId, state: labels.state, problem: labels.problem })
    .from(labels)
    .innerJoin(units, eq(units.id, labels.unitId))
    .where(eq(units.serial, serial))
    .orderBy(desc(labels.createdAt))
    .limit(1);
  return row ?? null;
}
