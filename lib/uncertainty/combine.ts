import { coverageFactor } from './student-t';

/** One line of a budget. `standard` is in the unit of the result, `degrees` its degrees of freedom (Infinity for type B). */
export interface Contribution {
  name: 'search' | 'repeatability' | 'meter-gain' | 'meter-offset' | 'meter-resolution';
  distribution: 'normal' | 'rectangular';
  standard: number;
  degrees: number;
}

export interface CombinedUncertainty {
  standard: number;
  effectiveDegrees: number;
  coverageFactor: number;
  expanded: number;
}

const coverage = 0.9545;

/**
 * Law of propagation for uncorrelated contributions of unit sensitivity, effective degrees of freedom by Welch and
 * Satterthwaite (truncated to the next lower whole number), coverage 95.45 %. JCGM 100:2008, 5.1.2, G.4.1 and G.6.4.
 */
export function combineContributions(contributions: Contribution[]): CombinedUncertainty {
  const standard = Math.sqrt(contributions.reduce((sum, c) => sum + c.standard ** 2, 0));
  const inverse = contributions.reduce((sum, c) => sum + c.standard ** 4 / c.degrees, 0);
  const effective = inverse > 0 ? standard ** 4 / inverse : Infinity;
  const effectiveDegrees = Number.isFinite(effective) ? Math.max(1, Math.floor(effective)) : Infinity;
  const k = coverageFactor(coverage, effectiveDegrees);
  return { standard, effectiveDegrees, coverageFactor: k, expanded: k * standard };
}
