import { compareReference } from '@/lib/bench/reference-check';
import type { ReferenceCheck, RunEnding } from '@/lib/bench/types';
import type { RunView } from '@/lib/contracts/bench-view';
import { brokenRun } from '@/lib/run/broken-run';
import type { RunPlan, RunResult } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import { faultOf } from './fault-of';
import type { RunLog } from './ports';
import { RunPerformer, type RunPerformerOptions } from './run-performer';

export interface RunJob {
  plan: RunPlan;
  /** Of a daily check; null for a board. */
  check: ReferenceCheck | null;
  /** Of a trial: a reject goes into no bin. */
  engineering: boolean;
  bench: Bench | null;
  clock: Clock;
  watchdogMs: number;
  binCode: string;
  log: RunLog;
  onView: RunPerformerOptions['onView'];
  onReading: RunPerformerOptions['onReading'];
  onProblem(error: unknown): void;
  /** The performer, to be told what people do; null once the run is over. */
  onPerformer(performer: RunPerformer | null): void;
}

export interface RunOver {
  ending: RunEnding;
  /** What the bench shows from now on; null when the run never began. */
  view: RunView | null;
  stored: boolean;
}

/** From the first effect to the closed record. Never rejects: whatever fails, the supply is off and the run has an ending. */
export async function performRun(job: RunJob): Promise<RunOver> {
  const { plan, check, engineering, clock, binCode } = job;
  const startedAtMs = clock.now();
  const { result, view } = await resultOfRun(job);
  const seconds = (clock.now() - startedAtMs) / 1000;
  const { stored, validUntilIso } = await job.log.close(result, seconds);
  const ending: RunEnding = {
    verdict: result.verdict,
    seconds,
    noVerdictReason: result.noVerdictReason,
    supplyConfirmedOff: result.supplyOff.confirmed,
    bin:
      result.verdict === 'reject' && !check && !engineering
        ? { runId: plan.runId, serial: plan.serial, binCode }
        : null,
    reference: check && { ...compareReference(check, result), validUntilIso },
  };
  return { ending, view, stored };
}

async function resultOfRun(job: RunJob): Promise<{ result: RunResult; view: RunView | null }> {
  const { plan, bench, clock, watchdogMs, log, onView, onReading, onPerformer, onProblem } = job;
  let performer: RunPerformer | null = null;
  try {
    if (!bench) throw new Error('The run began before the instruments were opened.');
    performer = new RunPerformer({ plan, bench, clock, watchdogMs, log, onView, onReading });
    onView(performer.view());
    onPerformer(performer);
    return { result: await performer.perform(), view: performer.view() };
  } catch (error) {
    onProblem(error);
    const result = brokenRun(bench ? await bench.safeOff() : { confirmed: false }, faultOf(error));
    return { result, view: performer && brokenView(performer.view(), result) };
  } finally {
    onPerformer(null);
  }
}

function brokenView(view: RunView, { faultCode, faultDetail, supplyOff }: RunResult): RunView {
  return {
    ...view,
    supply: supplyOff.confirmed ? { state: 'off', volts: supplyOff.volts ?? 0 } : { state: 'maybe-on' },
    screen: {
      kind: 'no-verdict',
      reason: 'interrupted',
      code: faultCode,
      detail: { code: 'run.fault', params: { detail: faultDetail ?? '' } },
      failingWhenStopped: false,
      stoppedAtVolts: null,
    },
  };
}
