import { normalAbove, normalBelow } from '../statistics/distributions/normal';
import type { Limits } from './judge-value';

export interface SpecificRisk {
  /** Probability that the true value meets the limits, and that it lies below or above them. They add up to 1. */
  conforming: number;
  below: number;
  above: number;
}

/**
 * What a measured `value` of standard uncertainty `standard` (> 0, same unit) says of this one board, nothing being known of
 * the board beforehand. JCGM 106:2012, 7.
 */
export function specificRisk(value: number, standard: number, { min, max }: Limits): SpecificRisk {
  const below = min === null ? 0 : normalBelow((min - value) / standard);
  const above = max === null ? 0 : normalAbove((max - value) / standard);
  return { conforming: Math.max(0, 1 - below - above), below, above };
}

/**
 * Mean and standard deviation of the true value where boards before it are known to spread normally about `prior.mean`; both
 * go into `specificRisk`. JCGM 106:2012, 6.2 and A.4.4.
 */
export function informedValue(
  value: number,
  standard: number,
  prior: { mean: number; deviation: number },
): { value: number; standard: number } {
  const weight = 1 / standard ** 2;
  const priorWeight = 1 / prior.deviation ** 2;
  return {
    value: (value * weight + prior.mean * priorWeight) / (weight + priorWeight),
    standard: 1 / Math.sqrt(weight + priorWeight),
  };
}
