import { exactSum } from './exact-sum';

/** Arithmetic mean, in the unit of the values; NaN of none. */
export const meanOf = (values: readonly number[]) => exactSum(values) / values.length;

/**
 * Sum of squared deviations from the mean. Two passes, the second corrected by the rounding of the mean (Chan, Golub and
 * LeVeque, The American Statistician 37, 1983).
 */
export function squaresAboutMean(values: readonly number[]): number {
  const centre = meanOf(values);
  const deviations = values.map((value) => value - centre);
  return Math.max(0, exactSum(deviations.map((d) => d * d)) - exactSum(deviations) ** 2 / values.length);
}

/** Standard deviation with n - 1, in the unit of the values; null of fewer than two, which have none. */
export function standardDeviation(values: readonly number[]): number | null {
  return values.length < 2 ? null : Math.sqrt(squaresAboutMean(values) / (values.length - 1));
}

/** Root of the weighted mean variance: `sds` with their degrees of freedom; null when there are none. NIST/SEMATECH e-Handbook 2.6.2. */
export function pooledDeviation(sds: readonly number[], degrees: readonly number[]): number | null {
  const total = exactSum(degrees);
  return total > 0 ? Math.sqrt(exactSum(sds.map((s, i) => s * s * degrees[i]!)) / total) : null;
}

/** Lag-one autocorrelation; null of fewer than three values or where all are alike. NIST StRD, univariate. */
export function lagOneAutocorrelation(values: readonly number[]): number | null {
  const squares = squaresAboutMean(values);
  if (values.length < 3 || !(squares > 0)) return null;
  const fromFirst = values.map((value) => value - values[0]!);
  const centre = meanOf(fromFirst);
  return exactSum(fromFirst.slice(1).map((value, i) => (value - centre) * (fromFirst[i]! - centre))) / squares;
}
