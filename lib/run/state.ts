import type { Decision, StepVisit } from '../decision/decide-verdict';
import type { RunFacts } from './facts';
import type { RunEvent, RunPlan } from './types';

/** The answers that each effect may have; `fault` besides. */
export type AnswerKind = Extract<RunEvent, { id: number }>['kind'];

/** Expanded uncertainty of the points, volts. */
export interface PointUncertainty {
  tripVolts: number;
  releaseVolts: number;
}

export type Phase =
  /** Going through the steps. */
  | { kind: 'steps' }
  /** Decided; switching the supply off for the `tries`-th time before the record is closed. */
  | { kind: 'ending'; decision: Decision; tries: number }
  | { kind: 'over'; decision: Decision };

/** Opaque to callers, never changed in place, and structured-cloneable. */
export interface RunState {
  plan: RunPlan;
  startedAtMs: number;
  atMs: number;
  nextId: number;
  /** The effect whose answer is awaited. */
  outstanding: { id: number; answer: AnswerKind } | null;
  stepIndex: number;
  machine: unknown;
  /** The steps that ended as done, in the order in which they were gone through. */
  path: readonly StepVisit[];
  facts: RunFacts;
  /** U that the verification is expected to reach, for the guard band drawn before it is known. */
  expectedUncertainty: PointUncertainty;
  phase: Phase;
  failingWhenStopped: boolean;
  /** Supply volts when the run was ended; null before, or with the supply off. */
  stoppedAtVolts: number | null;
}
