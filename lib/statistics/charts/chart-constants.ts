import { logGamma } from '../distributions/log-gamma';
import { rangeConstants } from './range-constants';

/** c4: mean of the standard deviation of `n` >= 2 normal values, in standard deviations. NIST/SEMATECH e-Handbook 6.3.2.1. */
export function c4(n: number): number {
  return Math.sqrt(2 / (n - 1)) * Math.exp(logGamma(n / 2) - logGamma((n - 1) / 2));
}

/**
 * Factors of three-sigma charts for samples of `n` (2 to 50), under their usual names; ASTM E2587 table, NIST/SEMATECH
 * e-Handbook 6.3.2.1. Exact to nine digits: printed tables made from rounded d2 and d3 differ in their last digit.
 */
export function chartConstants(n: number) {
  const { d2, d3 } = rangeConstants(n);
  const mean = c4(n);
  const spread = 3 * Math.sqrt(1 - mean * mean);
  return {
    d2,
    d3,
    c4: mean,
    A: 3 / Math.sqrt(n),
    A2: 3 / (d2 * Math.sqrt(n)),
    A3: 3 / (mean * Math.sqrt(n)),
    B3: Math.max(0, 1 - spread / mean),
    B4: 1 + spread / mean,
    B5: Math.max(0, mean - spread),
    B6: mean + spread,
    D1: Math.max(0, d2 - 3 * d3),
    D2: d2 + 3 * d3,
    D3: Math.max(0, 1 - (3 * d3) / d2),
    D4: 1 + (3 * d3) / d2,
    E2: 3 / d2,
  };
}
