import type { Contribution } from './combine';

export type Distribution = 'normal' | 'rectangular' | 'triangular' | 'u-shaped';

/** A row of an uncertainty budget as a metrologist writes it. */
export interface BudgetLine {
  contributor: string;
  distribution: Distribution;
  /** Standard deviation, expanded uncertainty or half width, in the contributor's unit, and what makes it standard. */
  spread: number;
  divisor: number;
  /** Unit of the result per unit of the contributor, with its sign. */
  sensitivity: number;
  /** Infinity for what is not estimated from repeats. */
  degrees: number;
}

/** Divisors of a half width; of a normal one it is 1 for a standard deviation, k for an expanded uncertainty. JCGM 100:2008, 4.3. */
export const halfWidthDivisor: Record<Exclude<Distribution, 'normal'>, number> = {
  rectangular: Math.sqrt(3),
  triangular: Math.sqrt(6),
  'u-shaped': Math.SQRT2,
};

/** Standard uncertainty of the contributor, in its own unit. */
export const standardOf = ({ spread, divisor }: BudgetLine) => spread / divisor;

/** A contribution that is already in the unit of the result, as a row of the table. */
export function lineOf({ name, distribution, standard, degrees }: Contribution): BudgetLine {
  const divisor = distribution === 'normal' ? 1 : halfWidthDivisor[distribution];
  return { contributor: name, distribution, spread: standard * divisor, divisor, sensitivity: 1, degrees };
}
