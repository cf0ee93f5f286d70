import { and, desc, eq, inArray, isNotNull, sql, type SQL } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import type { ChartQuantity, ReviewLimits } from '@/lib/contracts/lot-review';
import type { RejectReason } from '@/lib/run/types';

type Reader = Database | Transaction;

/** First attempt of a board with a verdict; engineering runs and runs without a verdict never count. */
export interface FirstAttempt {
  runId: string;
  serial: string;
  verdict: 'pass' | 'reject';
  rejectReason: RejectReason | null;
  lastVerdict: 'pass' | 'reject';
  startedAt: Date;
  endedAt: Date;
  stationCode: string;
  operatorId: string;
  operatorNumber: string | null;
  trimRounds: number;
  values: Record<ChartQuantity, number | null>;
  found: Record<ChartQuantity, number | null>;
}

const decided = (lotId: SQL | string) =>
  and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), inArray(runs.verdict, ['pass', 'reject']));

/** The newest measurement of its kind in a run. */
const measuredOf = (quantity: string, phase: string) =>
  sql<number | null>`(max(array[${measurements.n}::float8, ${measurements.value}])
    filter (where ${measurements.quantity} = ${quantity} and ${measurements.phase} = ${phase}))[2]`;

/** Every board of the lot that has a verdict, in test order of its first attempt. */
export async function listFirstAttempts(db: Reader, lotId: string): Promise<FirstAttempt[]> {
  const ofUnit = sql`(partition by ${runs.unitId} order by ${runs.attempt}`;
  const attempts = db
    .select({
      id: runs.id,
      unitId: runs.unitId,
      stationId: runs.stationId,
      operatorId: runs.operatorId,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      startedAt: runs.startedAt,
      endedAt: runs.endedAt,
      trimRounds: runs.trimRounds,
      turns: runs.turnsAdvised,
      seconds: runs.seconds,
      place: sql<number>`row_number() over ${ofUnit})`.as('place'),
      lastVerdict: sql<'pass' | 'reject'>`last_value(${runs.verdict}) over ${ofUnit}
        rows between unbounded preceding and unbounded following)`.as('last_verdict'),
    })
    .from(runs)
    .where(decided(lotId))
    .as('attempts');
  const points = db
    .select({
      trip: measuredOf('trip-volts', 'verified').as('trip'),
      release: measuredOf('release-volts', 'verified').as('release'),
      hysteresis: measuredOf('hysteresis-volts', 'verified').as('hysteresis'),
      foundTrip: measuredOf('trip-volts', 'found').as('found_trip'),
      foundRelease: measuredOf('release-volts', 'found').as('found_release'),
      foundHysteresis: measuredOf('hysteresis-volts', 'found').as('found_hysteresis'),
    })
    .from(measurements)
    .where(
      and(
        eq(measurements.runId, attempts.id),
        inArray(measurements.quantity, ['trip-volts', 'release-volts', 'hysteresis-volts']),
        inArray(measurements.phase, ['found', 'verified']),
      ),
    )
    .as('points');
  const rows = await db
    .select({
      runId: attempts.id,
      serial: units.serial,
      verdict: attempts.verdict,
      rejectReason: attempts.rejectReason,
      lastVerdict: attempts.lastVerdict,
      startedAt: attempts.startedAt,
      endedAt: attempts.endedAt,
      stationCode: stations.code,
      operatorId: attempts.operatorId,
      operatorNumber: accounts.operatorNumber,
      trimRounds: attempts.trimRounds,
      turns: attempts.turns,
      seconds: attempts.seconds,
      trip: points.trip,
      release: points.release,
      hysteresis: points.hysteresis,
      foundTrip: points.foundTrip,
      foundRelease: points.foundRelease,
      foundHysteresis: points.foundHysteresis,
    })
    .from(attempts)
    .innerJoin(units, eq(units.id, attempts.unitId))
    .innerJoin(stations, eq(stations.id, attempts.stationId))
    .innerJoin(accounts, eq(accounts.id, attempts.operatorId))
    .leftJoinLateral(points, sql`true`)
    .where(eq(attempts.place, 1))
    .orderBy(attempts.endedAt, units.position);
  return rows.map(({ turns, seconds, ...row }) => ({
    runId: row.runId,
    serial: row.serial,
    verdict: row.verdict as 'pass' | 'reject',
    rejectReason: row.rejectReason,
    lastVerdict: row.lastVerdict,
    startedAt: row.startedAt,
    endedAt: row.endedAt!,
    stationCode: row.stationCode,
    operatorId: row.operatorId,
    operatorNumber: row.operatorNumber,
    trimRounds: row.trimRounds ?? 0,
    values: {
      'trip-volts': row.trip,
      'release-volts': row.release,
      'hysteresis-volts': row.hysteresis,
      // A board that never came to trimming needed no turns that anyone knows.
      turns: row.foundTrip === null ? null : turns,
      seconds,
    },
    found: {
      'trip-volts': row.foundTrip,
      'release-volts': row.foundRelease,
      'hysteresis-volts': row.foundHysteresis,
      turns: null,
      seconds: null,
    },
  }));
}

/** Limits and guard band by which the newest verified board of the lot was judged; null before the first. */
export async function findReviewLimits(db: Reader, lotId: string, quantity: string): Promise<ReviewLimits | null> {
  const [row] = await db
    .select({
      min: measurements.min,
      max: measurements.max,
      guardedMin: measurements.guardedMin,
      guardedMax: measurements.guardedMax,
    })
    .from(runs)
    .innerJoin(
      measurements,
      and(
        eq(measurements.runId, runs.id),
        eq(measurements.quantity, sql`${quantity}`),
        eq(measurements.phase, 'verified'),
      ),
    )
    .where(and(decided(lotId), isNotNull(runs.endedAt)))
    .orderBy(desc(runs.startedAt))
    .limit(1);
  return row ?? null;
}

/** Runs without a verdict by station and operator: they are nobody's yield, but somebody may ask. */
export function countRunsWithoutVerdict(
  db: Reader,
  lotId: string,
): Promise<{ stationCode: string; operatorId: string; operatorNumber: string | null; runs: number }[]> {
  return db
    .select({
      stationCode: stations.code,
      operatorId: runs.operatorId,
      operatorNumber: accounts.operatorNumber,
      runs: sql<number>`count(*)::int`,
    })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .where(and(eq(runs.lotId, lotId), eq(runs.kind, 'production'), eq(runs.verdict, 'no-verdict')))
    .groupBy(stations.code, runs.operatorId, accounts.operatorNumber)
    .orderBy(stations.code, runs.operatorId);
}
