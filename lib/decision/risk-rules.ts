import { normalAbove } from '../statistics/distributions/normal';
import { drawIn, type Limits } from './judge-value';

export type RuleName = 'simple' | 'guarded' | 'one-sided-5-percent' | 'three-sigma' | 'customer-favourable';

/** Widths of the guard band in U, by the names of ILAC-G8:09/2019, table 1. */
export const guardFactors: Record<RuleName, number> = {
  simple: 0,
  guarded: 1,
  'one-sided-5-percent': 0.83,
  'three-sigma': 1.5,
  'customer-favourable': -1,
};

/**
 * Greatest probability that an accepted board is outside one limit, reached by a value on the acceptance limit: `factor` is
 * w/U, `coverage` the k that made U. ILAC-G8:09/2019, 4.2 and table 1.
 */
export const greatestRisk = (factor: number, coverage = 2) => normalAbove(factor * coverage);

export type Statement = 'pass' | 'conditional-pass' | 'conditional-fail' | 'fail';

/**
 * Non-binary statement under a guard band of width `w` >= 0: pass within the drawn-in limits, conditional up to the limits
 * and up to as far again outside. NaN fails. ILAC-G8:09/2019, 4.2.3.
 */
export function statementOf(value: number, limits: Limits, w: number): Statement {
  const within = ({ min, max }: Limits) => (min === null || value >= min) && (max === null || value <= max);
  if (Number.isNaN(value)) return 'fail';
  if (within(drawIn(limits, w))) return 'pass';
  if (within(limits)) return 'conditional-pass';
  return within(drawIn(limits, -w)) ? 'conditional-fail' : 'fail';
}
