import type { Say } from '../contracts/bench-view';
import type { LikelyCause, Measurement, NoVerdictReason, RejectReason, Verdict } from '../run/types';
import type { Sequence } from '../sequence/step';
import { reasonFor } from './reject-reason';
import { isProven, isWhole } from './whole-path';

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

/** A step that was gone through to its end. */
export interface StepVisit {
  stepIndex: number;
  /** Measurements of the run when it ended; those since the visit before are its own. */
  measured: number;
  /** Index that a branch went to, below 0 where there is no such step; null: the next one followed. */
  jumpedTo: number | null;
}

export interface Evidence {
  ending: Ending;
  sequence: Sequence;
  /** Steps that ended as done, in the order in which they were gone through, without the record itself. */
  path: readonly StepVisit[];
  measurements: readonly Measurement[];
  /** Read back below 2 V. */
  supplyOff: boolean;
}

export type Decision = { verdict: 'pass' } | Exclude<Ending, { kind: 'complete' }>;

/**
 * The one place where a board can pass: every step done that its way through the sequence required, points verified after
 * the screw was last touched, the supply read back as off, and every required and every judged measurement passed. A judged failure is a reject; anything missing is no verdict.
 */
export function decideVerdict({ ending, sequence, path, measurements, supplyOff }: Evidence): Decision {
  if (ending.kind !== 'complete') return ending;
  const failed = measurements.find((m) => m.passed === false);
  if (failed) return { kind: 'reject', cause: null, ...reasonFor(failed) };
  if (!isWhole(sequence, path) || !isProven(sequence, path, measurements)) {
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
