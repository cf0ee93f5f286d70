import { betaQuantile } from '../distributions/beta-quantile';
import { checkCount, type ShareInterval } from './interval';

/**
 * Exact two-sided interval of a share from `successes` of `trials` (at least 1): contains the true share with at least
 * `confidence`. Clopper and Pearson, Biometrika 26 (1934); NIST/SEMATECH e-Handbook 7.2.4.1.
 */
export function clopperPearson(successes: number, trials: number, confidence = 0.95): ShareInterval {
  checkCount(successes, trials);
  const tail = (1 - confidence) / 2;
  return {
    low: successes === 0 ? 0 : betaQuantile(tail, successes, trials - successes + 1),
    high: successes === trials ? 1 : 1 - betaQuantile(tail, trials - successes, successes + 1),
  };
}
