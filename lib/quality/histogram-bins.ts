import type { HistogramBin } from '../contracts/lot-review';
import { sampleQuantile } from '../statistics/summary/quantiles';

const mostBins = 60;
const wantedInTolerance = 20;

/** The next of 1, 2, 5 times a power of ten. */
function roundUp(width: number): number {
  const power = 10 ** Math.floor(Math.log10(width));
  return power * [1, 2, 5, 10].find((n) => n * power >= width * (1 - 1e-9))!;
}

/**
 * Width of the bins: a twentieth of the tolerance, so that lots of one board type are drawn alike; without limits by Freedman and
 * Diaconis (Zeitschrift für Wahrscheinlichkeitstheorie 57, 1981). Rounded up to 1, 2 or 5 of a decade; null without a spread.
 */
export function binWidth(
  values: readonly number[],
  limits: { min: number | null; max: number | null } | null,
): number | null {
  if (values.length === 0) return null;
  const tolerance = limits && limits.min !== null && limits.max !== null ? limits.max - limits.min : 0;
  if (tolerance > 0) return roundUp(tolerance / wantedInTolerance);
  const middle = sampleQuantile(values, 0.75) - sampleQuantile(values, 0.25);
  const width = (2 * middle) / Math.cbrt(values.length);
  return width > 0 ? roundUp(width) : null;
}

/**
 * Counts by bins of equal width whose edges are whole multiples of it; empty ones between filled ones are kept. A value on an edge
 * belongs above it. Values so far out that more than sixty bins would be needed are left to the chart, which pins them.
 */
export function histogramBins(values: readonly number[], width: number): HistogramBin[] {
  const places = values.map((value) => Math.floor(value / width + 1e-9));
  const middle = Math.floor(sampleQuantile(values, 0.5) / width + 1e-9);
  const inReach = places.filter((place) => Math.abs(place - middle) <= mostBins / 2);
  if (inReach.length === 0) return [];
  const first = inReach.reduce((a, b) => Math.min(a, b));
  const last = inReach.reduce((a, b) => Math.max(a, b));
  const bins = Array.from({ length: last - first + 1 }, (_, i) => ({
    from: (first + i) * width,
    to: (first + i + 1) * width,
    boards: 0,
  }));
  for (const place of inReach) bins[place - first]!.boards++;
  return bins;
}
