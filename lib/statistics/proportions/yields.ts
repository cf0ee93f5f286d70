import { clopperPearson } from './clopper-pearson';
import type { ShareInterval } from './interval';
import { wilson } from './wilson';

export interface Operation {
  /** Boards that entered this operation with a verdict to come, and those of them that passed it at the first attempt. */
  entered: number;
  passedFirst: number;
}

export interface Yield extends ShareInterval {
  share: number;
}

/** A first-pass or final yield with its interval; null before the first verdict. Runs without a verdict are in neither count. */
export function yieldOf(passed: number, tested: number, method: 'exact' | 'wilson', confidence = 0.95): Yield | null {
  if (tested === 0) return null;
  const interval = (method === 'exact' ? clopperPearson : wilson)(passed, tested, confidence);
  return { share: passed / tested, ...interval };
}

/**
 * Rolled throughput yield: the product of the operations' first-attempt yields, the share of boards expected to go through
 * all of them without rework. Null while an operation has no board. The interval joins the operations' Wilson limits on
 * the log scale (Zou and Donner, Statistics in Medicine 27, 2008), operations taken as independent; a yield of 0 gives 0
 * as the lower limit.
 */
export function rolledThroughputYield(operations: readonly Operation[], confidence = 0.95): Yield | null {
  if (operations.length === 0 || operations.some(({ entered }) => entered === 0)) return null;
  const parts = operations.map(({ passedFirst, entered }) => ({
    share: passedFirst / entered,
    ...wilson(passedFirst, entered, confidence),
  }));
  const share = parts.reduce((product, part) => product * part.share, 1);
  if (share === 0) return { share, low: 0, high: Math.min(...parts.map((part) => part.high)) };
  const below = Math.hypot(...parts.map((part) => Math.log(part.share / part.low)));
  const above = Math.hypot(...parts.map((part) => Math.log(part.high / part.share)));
  return { share, low: share * Math.exp(-below), high: Math.min(1, share * Math.exp(above)) };
}
