import { eq } from 'drizzle-orm';
import type { Database } from '@/db/client';
import { measurements } from '@/db/schema/measurements';
import { runs } from '@/db/schema/runs';
import { traces } from '@/db/schema/traces';
import type { Measurement, NoVerdictReason, RejectReason, RunPlan } from '@/lib/run/types';

export interface RunStory {
  unit: { id: string; serial: string; lotId: string };
  stationId: string;
  operatorId: string;
  attempt: number;
  /** Minutes after 08:00 on 1 December 2026. */
  minute: number;
  ending:
    | { verdict: 'pass' }
    | { verdict: 'reject'; reason: RejectReason }
    | { verdict: 'no-verdict'; reason: NoVerdictReason; failing?: boolean };
  tripVolts?: number;
  releaseVolts?: number;
}

export function measured(over: Partial<Measurement> & Pick<Measurement, 'quantity' | 'value'>): Measurement {
  return {
    phase: 'verified',
    standardUncertainty: 0.002,
    expandedUncertainty: 0.004,
    min: null,
    max: null,
    guardedMin: null,
    guardedMax: null,
    passed: true,
    stepIndex: 0,
    settles: null,
    ...over,
  };
}

/** A finished production run as the station would have recorded it. */
export async function insertRun(db: Database, story: RunStory): Promise<{ id: string }> {
  const startedAt = new Date(Date.UTC(2026, 11, 1, 8, story.minute));
  const endedAt = new Date(startedAt.getTime() + 15_000);
  return db.transaction(async (tx) => {
    const [run] = await tx
      .insert(runs)
      .values({
        kind: 'production',
        unitId: story.unit.id,
        lotId: story.unit.lotId,
        stationId: story.stationId,
        operatorId: story.operatorId,
        attempt: story.attempt,
        plan: { serial: story.unit.serial, sequenceRevision: 'r6' } as RunPlan,
        startedAt,
      })
      .returning();
    const values = [
      measured({ quantity: 'trip-volts', phase: 'found', value: 10.34, min: 10.7, max: 10.9, passed: null }),
      measured({ quantity: 'trip-volts', value: story.tripVolts ?? 10.81, min: 10.7, max: 10.9 }),
      measured({ quantity: 'release-volts', value: story.releaseVolts ?? 12.23, min: 12.1, max: 12.5 }),
    ];
    await tx.insert(measurements).values(values.map((value, n) => ({ ...value, runId: run!.id, n })));
    await tx.insert(traces).values({
      runId: run!.id,
      n: 0,
      kind: 'find-points',
      atMs: [0, 500, 900],
      volts: [12, 11, 10.2],
      output: [1, 1, 0],
    });
    const { ending } = story;
    await tx
      .update(runs)
      .set({
        endedAt,
        verdict: ending.verdict,
        rejectReason: ending.verdict === 'reject' ? ending.reason : null,
        noVerdictReason: ending.verdict === 'no-verdict' ? ending.reason : null,
        failingWhenStopped: ending.verdict === 'no-verdict' && (ending.failing ?? false),
        supplyOffConfirmed: true,
        supplyOffVolts: 0.2,
        supplyOffBy: 'meter',
        seconds: 15,
        trimRounds: 1,
        turnsAdvised: 0.5,
        closedBy: 'station',
      })
      .where(eq(runs.id, run!.id));
    return run!;
  });
}
