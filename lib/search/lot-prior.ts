import type { SearchPrior } from './types';

/** Boards that must be known before their lot says anything about the next one. */
export const leastBoards = 10;
/** The lot is never believed to be narrower than this: a drifting process must not be hidden by its past. Volts. */
const leastSdVolts = 0.02;
/** Boards this many robust deviations off the median say nothing about sound ones. */
const outlierDeviations = 4;
/** Median absolute deviation of a normal distribution in standard deviations. */
const madOfNormal = 0.6745;

/**
 * The lot's own distribution of trip and hysteresis, from the points found on its earlier boards before any trim; null while
 * fewer than ten are known. Defective boards are left out by median and median absolute deviation (Hampel's identifier).
 */
export function lotPrior(found: readonly { tripVolts: number; hysteresisVolts: number }[]): SearchPrior | null {
  const trip = spreadOf(found.map((board) => board.tripVolts));
  const hysteresis = spreadOf(found.map((board) => board.hysteresisVolts));
  if (!trip || !hysteresis) return null;
  return {
    tripMeanVolts: trip.mean,
    tripSdVolts: trip.sd,
    hysteresisMeanVolts: hysteresis.mean,
    hysteresisSdVolts: hysteresis.sd,
  };
}

function spreadOf(values: number[]): { mean: number; sd: number } | null {
  if (values.length < leastBoards) return null;
  const middle = median(values);
  const deviation = median(values.map((value) => Math.abs(value - middle))) / madOfNormal;
  const widest = outlierDeviations * Math.max(deviation, leastSdVolts);
  const kept = values.filter((value) => Math.abs(value - middle) <= widest);
  const mean = kept.reduce((sum, value) => sum + value, 0) / kept.length;
  const squares = kept.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return { mean, sd: Math.max(leastSdVolts, Math.sqrt(squares / Math.max(1, kept.length - 1))) };
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}
