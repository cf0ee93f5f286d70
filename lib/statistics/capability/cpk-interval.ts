import { normalQuantile } from '../distributions/normal-quantile';

/**
 * Approximate two-sided interval of Cpk or Ppk from `count` normal values, good from about 30 on. `degrees` are those of the
 * standard deviation. A. F. Bissell, Applied Statistics 39 (1990); NIST/SEMATECH e-Handbook 6.1.6.
 */
export function cpkInterval(
  cpk: number,
  count: number,
  degrees = count - 1,
  confidence = 0.95,
): { low: number; high: number } {
  const z = normalQuantile((1 + confidence) / 2);
  const half = z * Math.sqrt(1 / (9 * count) + (cpk * cpk) / (2 * degrees));
  return { low: cpk - half, high: cpk + half };
}
