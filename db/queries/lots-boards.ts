import { and, asc, desc, eq, inArray } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { labels } from '@/db/schema/labels';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';

export interface BoardPoint {
  value: number;
  min: number | null;
  max: number | null;
}

/** Of each unit's newest run that ended: when, where, and the points it measured last. A run without a verdict judged none. */
export interface NewestRun {
  unitId: string;
  runId: string;
  endedAt: Date;
  seconds: number | null;
  stationCode: string;
  tripVolts: BoardPoint | null;
  releaseVolts: BoardPoint | null;
}

/** Of the whole lot, or of these units of it. */
export async function listNewestRuns(db: Database, lotId: string, unitIds?: readonly string[]): Promise<NewestRun[]> {
  const newest = await db
    .selectDistinctOn([runs.unitId], {
      unitId: runs.unitId,
      runId: runs.id,
      endedAt: runs.endedAt,
      seconds: runs.seconds,
      stationCode: stations.code,
      verdict: runs.verdict,
    })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(
      and(
        eq(runs.lotId, lotId),
        eq(runs.kind, 'production'),
        inArray(runs.verdict, ['pass', 'reject', 'no-verdict']),
        unitIds ? inArray(runs.unitId, [...unitIds]) : undefined,
      ),
    )
    .orderBy(asc(runs.unitId), desc(runs.attempt));
  if (newest.length === 0) return [];
  const points = await db
    .select({
      runId: measurements.runId,
      quantity: measurements.quantity,
      value: measurements.value,
      min: measurements.min,
      max: measurements.max,
    })
    .from(measurements)
    .where(
      and(
        inArray(
          measurements.runId,
          newest.map((run) => run.runId),
        ),
        inArray(measurements.quantity, ['trip-volts', 'release-volts']),
      ),
    )
    .orderBy(asc(measurements.n));
  // Later measurements of the run replace earlier ones.
  const last = new Map(points.map(({ runId, quantity, ...point }) => [`${runId} ${quantity}`, point]));
  return newest.map(({ verdict, ...run }) => {
    const pointOf = (quantity: string) =>
      verdict === 'no-verdict' ? null : (last.get(`${run.runId} ${quantity}`) ?? null);
    return {
      ...run,
      unitId: run.unitId!,
      endedAt: run.endedAt!,
      tripVolts: pointOf('trip-volts'),
      releaseVolts: pointOf('release-volts'),
    };
  });
}

/** The newest label's state of each unit that has one. */
export async function listNewestLabels(db: Database, lotId: string, unitIds?: readonly string[]) {
  return db
    .selectDistinctOn([labels.unitId], { unitId: labels.unitId, state: labels.state, problem: labels.problem })
    .from(labels)
    .innerJoin(units, eq(units.id, labels.unitId))
    .where(and(eq(units.lotId, lotId), unitIds ? inArray(units.id, [...unitIds]) : undefined))
    .orderBy(asc(labels.unitId), desc(labels.createdAt));
}
