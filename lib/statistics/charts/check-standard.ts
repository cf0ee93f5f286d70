import { fQuantile } from '../distributions/f-distribution';
import { meanOf, pooledDeviation, standardDeviation } from '../summary/moments';
import type { ChartLimits, NoBaseline } from './limits';

export interface CheckStandardBaseline {
  kind: 'found';
  /** Daily values of the reference board: mean ± width standard deviations of the history. */
  values: ChartLimits & { sigma: number };
  /** Short-term standard deviation of one day's readings: pooled, and the value a day's must not exceed. */
  precision: { pooled: number; degrees: number; upper: number };
}

/**
 * Control of a daily check by a reference board. `values` are its daily results, `sds` their short-term standard deviations
 * of `degrees` degrees of freedom each. `width` (3) for the values; `confidence` (0.99) of the one-sided F limit for the
 * precision. At least two days. NIST/SEMATECH e-Handbook 2.2.2.1 and 2.2.3.1.
 */
export function checkStandardBaseline(
  values: readonly number[],
  sds: readonly number[],
  degrees: number,
  { width = 3, confidence = 0.99 } = {},
): CheckStandardBaseline | NoBaseline {
  const sigma = standardDeviation(values);
  const pooled = pooledDeviation(
    sds,
    sds.map(() => degrees),
  );
  if (sigma === null || pooled === null) return { kind: 'tooFew', needed: 2 };
  if (!(sigma > 0)) return { kind: 'noSpread' };
  const centre = meanOf(values);
  const total = sds.length * degrees;
  return {
    kind: 'found',
    values: { centre, lower: centre - width * sigma, upper: centre + width * sigma, sigma },
    precision: { pooled, degrees: total, upper: pooled * Math.sqrt(fQuantile(confidence, degrees, total)) },
  };
}
