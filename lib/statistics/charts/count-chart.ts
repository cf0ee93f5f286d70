import type { ChartLimits } from './limits';
import { meanOf } from '../summary/moments';

/** c chart: limits of counts of equal opportunity, mean ± 3 sqrt(mean); null of none. NIST/SEMATECH e-Handbook 6.3.3.1. */
export function countLimits(counts: readonly number[]): ChartLimits | null {
  if (counts.length === 0) return null;
  const centre = meanOf(counts);
  const reach = 3 * Math.sqrt(centre);
  return { centre, lower: centre - reach > 0 ? centre - reach : null, upper: centre + reach };
}
