import { checkCount, type ShareInterval } from './interval';
import { wilson } from './wilson';

/** The same boards judged twice. */
export interface PairedCounts {
  both: number;
  onlyA: number;
  onlyB: number;
  neither: number;
}

/**
 * Interval of the share that A passes less that of B (-1 to 1), from the same boards (at least 1). R. G. Newcombe, Statistics
 * in Medicine 17 (1998) 2635-2650, method 10: the Wilson limits of both shares, joined with the correlation of the pairs,
 * which is corrected for continuity.
 */
export function newcombePaired(counts: PairedCounts, confidence = 0.95): ShareInterval & { difference: number } {
  const { both, onlyA, onlyB, neither } = counts;
  const boards = both + onlyA + onlyB + neither;
  for (const count of [both, onlyA, onlyB, neither]) checkCount(count, boards);
  const shareA = (both + onlyA) / boards;
  const shareB = (both + onlyB) / boards;
  const ofA = wilson(both + onlyA, boards, confidence);
  const ofB = wilson(both + onlyB, boards, confidence);
  const phi = correlation(counts, boards);
  const spread = (a: number, b: number) => Math.sqrt(Math.max(0, a * a - 2 * phi * a * b + b * b));
  const difference = (onlyA - onlyB) / boards;
  return {
    difference,
    low: difference - spread(shareA - ofA.low, ofB.high - shareB),
    high: difference + spread(ofA.high - shareA, shareB - ofB.low),
  };
}

function correlation({ both, onlyA, onlyB, neither }: PairedCounts, boards: number): number {
  const product = (both + onlyA) * (onlyB + neither) * (both + onlyB) * (onlyA + neither);
  if (product === 0) return 0;
  const cross = both * neither - onlyA * onlyB;
  const corrected = cross > boards / 2 ? cross - boards / 2 : cross >= 0 ? 0 : cross;
  return corrected / Math.sqrt(product);
}
