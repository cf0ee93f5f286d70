import type { Say } from '../contracts/bench-view';
import type { LikelyCause, Measurement, NoVerdictReason, RejectReason, Verdict } from '../run/types';
import type { Sequence } from '../sequence/step';
import { reasonFor } from './reject-reason';
import { requiredMeasurements } from './required-measurements';

/** What is behind a reject: a value in the unit of its quantity and the limit that it missed. */
export interface Finding {
  value: number;
  unit: string;
  limit: number | null;
}

/** How a run came to its end. `complete`: every step but the record was gone through without a reject. */
export type Ending =
  | { kind: 'complete' }
  | { kind: 'reject'; reason: RejectReason; cause: LikelyCause | null; measured: Finding | null }
  | { kind: 'no-verdict'; reason: NoVerdictReason; code: string | null; detail: Say | null; fault: string | null };

export interface Evidence {
  ending: Ending;
  sequence: Sequence;
  /** Steps that ended as done, from the first, without the record itself. */
  stepsDone: number;
  measurements: readonly Measurement[];
  /** Read back below 2 V. */
  supplyOff: boolean;
}

export type Decision = { verdict: 'pass' } | Exclude<Ending, { kind: 'complete' }>;

/**
 * The one place where a board can pass: every step done, the supply read back as off, every required measurement
 * present, and every judged measurement passed. A judged failure is a reject; anything missing is no verdict.
 */
export function decideVerdict({ ending, sequence, stepsDone, measurements, supplyOff }: Evidence): Decision {
  if (ending.kind !== 'complete') return ending;
  const failed = measurements.find((m) => m.passed === false);
  if (failed) return { kind: 'reject', cause: null, ...reasonFor(failed) };
  const missing = requiredMeasurements(sequence).some(
    (required) =>
      !measurements.some(
        (m) =>
          m.quantity === required.quantity &&
          m.phase === required.phase &&
          m.stepIndex === required.stepIndex &&
          m.passed === true,
      ),
  );
  const whole = stepsDone === sequence.steps.length - 1 && sequence.steps.at(-1)?.kind === 'record';
  if (missing || !whole) {
    return {
      kind: 'no-verdict',
      reason: 'interrupted',
      code: 'R-901',
      detail: { code: 'run.incomplete' },
      fault: null,
    };
  }
  if (!supplyOff) {
    return {
      kind: 'no-verdict',
      reason: 'supply-fault',
      code: 'S-290',
      detail: { code: 'run.supply-not-confirmed-off' },
      fault: null,
    };
  }
  return { verdict: 'pass' };
}

export function verdictOf(decision: Decision): Verdict {
  return 'verdict' in decision ? decision.verdict : decision.kind;
}
