import { normalQuantile } from '../distributions/normal-quantile';
import { checkCount, type ShareInterval } from './interval';

/**
 * Score interval of a share from `successes` of `trials` (at least 1), whose mean coverage is close to `confidence`.
 * E. B. Wilson, JASA 22 (1927); NIST/SEMATECH e-Handbook 7.2.4.1.
 */
export function wilson(successes: number, trials: number, confidence = 0.95): ShareInterval {
  checkCount(successes, trials);
  const z = normalQuantile((1 + confidence) / 2);
  const share = successes / trials;
  const centre = share + (z * z) / (2 * trials);
  const half = z * Math.sqrt((share * (1 - share)) / trials + (z * z) / (4 * trials * trials));
  const scale = 1 + (z * z) / trials;
  return {
    low: successes === 0 ? 0 : Math.max(0, (centre - half) / scale),
    high: successes === trials ? 1 : Math.min(1, (centre + half) / scale),
  };
}
