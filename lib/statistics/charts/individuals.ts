import { meanOf } from '../summary/moments';
import type { ChartLimits, NoBaseline } from './limits';
import { chartConstants } from './chart-constants';

/** Limits of an individuals and moving range chart, to be frozen: never recomputed from the lot that they judge. */
export interface IndividualsBaseline {
  kind: 'found';
  /** Values the limits rest on. */
  count: number;
  individuals: ChartLimits & { lower: number; upper: number };
  movingRange: ChartLimits & { upper: number };
  /** Mean moving range over d2, in the unit of the values. */
  sigma: number;
}

/**
 * Limits from the values of a baseline in time order, at least two (20 to 30 are usual): mean ± 3 MR̄/d2, and D4 MR̄ for the
 * moving range of two. `breaksBefore` lists places where the range to the value before is no moving range (the first board
 * of another lot). NIST/SEMATECH e-Handbook 6.3.2.2.
 */
export function individualsBaseline(
  values: readonly number[],
  breaksBefore: readonly number[] = [],
): IndividualsBaseline | NoBaseline {
  const ranges = movingRanges(values, breaksBefore).filter((range) => range !== null);
  if (ranges.length === 0) return { kind: 'tooFew', needed: 2 };
  const meanRange = meanOf(ranges);
  if (!(meanRange > 0)) return { kind: 'noSpread' };
  const { d2, D4 } = chartConstants(2);
  const sigma = meanRange / d2;
  const centre = meanOf(values);
  return {
    kind: 'found',
    count: values.length,
    individuals: { centre, lower: centre - 3 * sigma, upper: centre + 3 * sigma },
    movingRange: { centre: meanRange, lower: null, upper: D4 * meanRange },
    sigma,
  };
}

/** Distance of every value to the one before; null for the first and after a break. Same length as `values`. */
export function movingRanges(values: readonly number[], breaksBefore: readonly number[] = []): (number | null)[] {
  const breaks = new Set(breaksBefore);
  return values.map((value, i) => (i === 0 || breaks.has(i) ? null : Math.abs(value - values[i - 1]!)));
}

/** Values in standard deviations from the centre, as the run rules take them. */
export function standardised(values: readonly number[], baseline: IndividualsBaseline): number[] {
  return values.map((value) => (value - baseline.individuals.centre) / baseline.sigma);
}
