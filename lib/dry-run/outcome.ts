import type { RejectReason, Verdict } from '../run/types';

/** What became of one simulated board. Plain data: it travels between threads. */
export interface DryBoardOutcome {
  verdict: Verdict;
  reason: RejectReason | null;
  /** Step at which the board was lost; null where it passed. */
  stepId: string | null;
  /** Verified, volts; null where the run did not get so far. */
  tripVolts: number | null;
  releaseVolts: number | null;
  seconds: number;
  /** Of these, what the run waited for the person. */
  personSeconds: number;
  /** Simulated truth: inside every limit as trimmed, or, lost before its trim was done, could have been. */
  good: boolean;
}
