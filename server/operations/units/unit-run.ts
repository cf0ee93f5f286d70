import type { listMeasurements, listRunsOfUnit, listTraces } from '@/db/queries/units';
import type { UnitRun } from '@/lib/contracts/unit-page';

type MadeRun = Awaited<ReturnType<typeof listRunsOfUnit>>[number];
type Rows<F extends (...args: never[]) => Promise<unknown>> = Awaited<ReturnType<F>>;

/** A step as the sequence's author calls it, else by its number. */
function stepWords(step: { name?: string } | undefined, index: number): string {
  return step?.name || `step ${index + 1}`;
}

/** A run as its page shows it, with those of the measurements and traces that are its own. */
export function unitRunOf(
  { run, stationCode, fixture, operatorNumber, operatorName }: MadeRun,
  measurements: Rows<typeof listMeasurements>,
  traces: Rows<typeof listTraces>,
): UnitRun {
  return {
    id: run.id,
    kind: run.kind,
    attempt: run.attempt,
    startedIso: run.startedAt.toISOString(),
    endedIso: run.endedAt?.toISOString() ?? null,
    seconds: run.seconds,
    verdict: run.verdict,
    rejectReason: run.rejectReason,
    likelyCause: run.likelyCause,
    noVerdictReason: run.noVerdictReason,
    faultCode: run.faultCode,
    faultDetail: run.faultDetail,
    failingWhenStopped: run.failingWhenStopped,
    supplyOff:
      run.supplyOffConfirmed === null
        ? null
        : { confirmed: run.supplyOffConfirmed, volts: run.supplyOffVolts, by: run.supplyOffBy },
    closedBy: run.closedBy,
    stationCode,
    fixture,
    operatorNumber,
    operatorName,
    sequenceRevision: run.plan.sequenceRevision,
    trimRounds: run.trimRounds,
    turnsAdvised: run.turnsAdvised,
    binCode: run.binCode,
    binScannedIso: run.binScannedAt?.toISOString() ?? null,
    limits: run.plan.boardType?.limits ?? null,
    adjustments: run.adjustments ?? [],
    measurements: measurements
      .filter((measurement) => measurement.runId === run.id)
      .map(({ runId: _runId, stepIndex, ...measurement }) => ({
        ...measurement,
        step: stepWords(run.plan.sequence?.steps[stepIndex], stepIndex),
      })),
    traces: traces
      .filter((trace) => trace.runId === run.id)
      .map(({ kind, atMs, volts, output }) => ({ kind, atMs, volts, output })),
  };
}
