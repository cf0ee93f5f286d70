/**
 * Degrees of freedom that a standard deviation estimated as MR̄/d2 from `n` >= 2 values is worth: those of a standard
 * deviation with the same relative variance, 1/(2 Var). About 0.61 (n - 1). The variance is exact for normal values:
 * Cryer and Ryan, Journal of Quality Technology 22 (1990).
 */
export function movingRangeDegrees(n: number): number {
  const ranges = n - 1;
  const single = Math.PI / 2 - 1;
  // Twice the covariance of two ranges that share a value.
  const neighbours = Math.PI / 6 + Math.sqrt(3) - 2;
  const variance = (single * ranges + neighbours * (ranges - 1)) / (ranges * ranges);
  return 1 / (2 * variance);
}
