import { compareReference } from '@/lib/bench/reference-check';
import type { ReferenceCheck, RunEnding } from '@/lib/bench/types';
import type { RunPlan, RunResult } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import type { SafeOffReport } from '../instruments/safe-off';
import { faultOf } from './fault-of';
import type { RunLog } from './ports';
import { RunPerformer, type RunPerformerOptions } from './run-performer';

export interface RunJob {
  plan: RunPlan;
  /** Of a daily check; null for a board. */
  check: ReferenceCheck | null;
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

/** From the first effect to the closed record. Never rejects: whatever fails, the supply is off and the run has an ending. */
export async function performRun(job: RunJob): Promise<{ ending: RunEnding; stored: boolean }> {
  const { plan, check, clock, binCode } = job;
  const startedAtMs = clock.now();
  const result = await resultOfRun(job);
  const seconds = (clock.now() - startedAtMs) / 1000;
  const { stored, validUntilIso } = await job.log.close(result, seconds);
  const ending: RunEnding = {
    verdict: result.verdict,
    seconds,
    noVerdictReason: result.noVerdictReason,
    supplyConfirmedOff: result.supplyOff.confirmed,
    bin: result.verdict === 'reject' && !check ? { runId: plan.runId, serial: plan.serial, binCode } : null,
    reference: check && { ...compareReference(check, result), validUntilIso },
  };
  return { ending, stored };
}

async function resultOfRun(job: RunJob): Promise<RunResult> {
  const { plan, bench, clock, watchdogMs, log, onView, onReading, onPerformer, onProblem } = job;
  try {
    if (!bench) throw new Error('The run began before the instruments were opened.');
    const performer = new RunPerformer({ plan, bench, clock, watchdogMs, log, onView, onReading });
    onView(performer.view());
    onPerformer(performer);
    return await performer.perform();
  } catch (error) {
    onProblem(error);
    return brokenOff(error, bench ? await bench.safeOff() : { confirmed: false });
  } finally {
    onPerformer(null);
  }
}

/** A run whose engine failed: the station's fault, never the board's. */
function brokenOff(error: unknown, off: SafeOffReport): RunResult {
  const { code, detail } = faultOf(error);
  return {
    verdict: 'no-verdict',
    rejectReason: null,
    likelyCause: null,
    noVerdictReason: 'interrupted',
    faultCode: code,
    faultDetail: detail,
    failingWhenStopped: false,
    supplyOff: off.confirmed
      ? { confirmed: true, volts: off.volts, by: off.by }
      : { confirmed: false, volts: null, by: null },
    measurements: [],
    trimRounds: 0,
    turnsAdvised: 0,
  };
}
