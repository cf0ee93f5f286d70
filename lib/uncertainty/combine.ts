import { coverageFactor } from './student-t';
import { effectiveDegrees } from './welch-satterthwaite';

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

export const usualCoverage = 0.9545;

/**
 * Law of propagation for uncorrelated contributions of unit sensitivity, effective degrees of freedom by Welch and
 * Satterthwaite (truncated to the next lower whole number), coverage 95.45 %. JCGM 100:2008, 5.1.2, G.4.1 and G.6.4.
 */
export function combineContributions(contributions: Contribution[]): CombinedUncertainty {
  const standard = Math.sqrt(contributions.reduce((sum, c) => sum + c.standard ** 2, 0));
  const degrees = effectiveDegrees(contributions);
  const k = coverageFactor(usualCoverage, degrees);
  return { standard, effectiveDegrees: degrees, coverageFactor: k, expanded: k * standard };
}
