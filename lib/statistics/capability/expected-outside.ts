import { normalAbove, normalBelow } from '../distributions/normal';
import type { SpecificationLimits } from './indices';

/** Boards in a million beyond each limit, were the values normal with this mean and standard deviation. */
export function expectedOutside(mean: number, sigma: number, { min, max }: SpecificationLimits) {
  const below = min === null ? 0 : 1e6 * normalBelow((min - mean) / sigma);
  const above = max === null ? 0 : 1e6 * normalAbove((max - mean) / sigma);
  return { perMillionBelow: below, perMillionAbove: above, perMillion: below + above };
}
