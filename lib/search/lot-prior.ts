import type { SearchPrior } from './types';

/** Boards of the lot whose points must be known before the lot's distribution is used. */
export const fewestKnownBoards = 10;

/** The narrowest distributions that were studied (own study, simulation); a lot may well be tighter, the search gains no more. */
const leastTripSdVolts = 0.03;
const leastHysteresisSdVolts = 0.02;

export interface FoundPoints {
  tripVolts: number;
  hysteresisVolts: number;
}

/**
 * The lot's own distribution from the points found on its earlier boards (before trimming), or null while fewer than
 * ten are known. Robust, since defective boards are among them: median, and median absolute deviation scaled to a
 * standard deviation (1.4826, with the small-sample factor n / (n - 0.8) of Croux and Rousseeuw 1992), widened by the
 * median's own uncertainty. Volts.
 */
export function lotPrior(found: readonly FoundPoints[]): SearchPrior | null {
  if (found.length < fewestKnownBoards) return null;
  const trip = spreadOf(found.map((points) => points.tripVolts));
  const hysteresis = spreadOf(found.map((points) => points.hysteresisVolts));
  return {
    tripMeanVolts: trip.middle,
    tripSdVolts: Math.max(leastTripSdVolts, trip.sd),
    hysteresisMeanVolts: hysteresis.middle,
    hysteresisSdVolts: Math.max(leastHysteresisSdVolts, hysteresis.sd),
  };
}

function spreadOf(values: readonly number[]): { middle: number; sd: number } {
  const middle = median(values);
  const deviation = median(values.map((value) => Math.abs(value - middle)));
  const n = values.length;
  const sd = 1.4826 * deviation * (n / (n - 0.8)) * Math.sqrt(1 + Math.PI / 2 / n);
  return { middle, sd };
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}
