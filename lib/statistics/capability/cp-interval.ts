import { chiSquareQuantile } from '../distributions/chi-square';

/**
 * Exact two-sided interval of Cp or Pp for normal values. `degrees` are those of the standard deviation: n - 1 of all
 * values, `movingRangeDegrees` of a moving range. NIST/SEMATECH e-Handbook 6.1.6.
 */
export function cpInterval(cp: number, degrees: number, confidence = 0.95): { low: number; high: number } {
  const tail = (1 - confidence) / 2;
  return {
    low: cp * Math.sqrt(chiSquareQuantile(tail, degrees) / degrees),
    high: cp * Math.sqrt(chiSquareQuantile(1 - tail, degrees) / degrees),
  };
}
