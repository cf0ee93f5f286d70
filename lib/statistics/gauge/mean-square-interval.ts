import { chiSquareQuantile } from '../distributions/chi-square';
import { fQuantile } from '../distributions/f-distribution';

/** A mean square with its degrees of freedom and its coefficient in the sum. */
export interface WeightedSquare {
  coefficient: number;
  meanSquare: number;
  degrees: number;
}

export interface VarianceInterval {
  low: number;
  high: number;
}

/**
 * Interval of a variance that is a sum of mean squares with positive coefficients: modified large samples after Graybill
 * and Wang, JASA 75 (1980). With one term it is the exact chi-squared interval.
 */
export function sumInterval(terms: readonly WeightedSquare[], confidence = 0.95): VarianceInterval {
  const tail = (1 - confidence) / 2;
  const estimate = terms.reduce((sum, t) => sum + t.coefficient * t.meanSquare, 0);
  const parts = terms.map(({ coefficient, meanSquare, degrees }) => {
    const value = coefficient * meanSquare;
    return {
      below: value * (1 - degrees / chiSquareQuantile(1 - tail, degrees)),
      above: value * (degrees / chiSquareQuantile(tail, degrees) - 1),
    };
  });
  return {
    low: Math.max(0, estimate - Math.hypot(...parts.map((p) => p.below))),
    high: estimate + Math.hypot(...parts.map((p) => p.above)),
  };
}

/**
 * Interval of a variance that is one mean square less another, both times the coefficient of the first: modified large
 * samples after Ting, Burdick, Graybill, Jeyaratnam and Lu, J. Statist. Comput. Simul. 35 (1990); Burdick, Borror and
 * Montgomery, Design and Analysis of Gauge R&R Studies (2005). Limits below 0 are 0.
 */
export function differenceInterval(plus: WeightedSquare, minus: WeightedSquare, confidence = 0.95): VarianceInterval {
  const tail = (1 - confidence) / 2;
  const a = plus.coefficient * plus.meanSquare;
  const b = minus.coefficient * minus.meanSquare;
  const below = (degrees: number) => 1 - degrees / chiSquareQuantile(1 - tail, degrees);
  const above = (degrees: number) => degrees / chiSquareQuantile(tail, degrees) - 1;
  const [g1, g2] = [below(plus.degrees), below(minus.degrees)];
  const [h1, h2] = [above(plus.degrees), above(minus.degrees)];
  const upper = fQuantile(1 - tail, plus.degrees, minus.degrees);
  const lower = fQuantile(tail, plus.degrees, minus.degrees);
  const g12 = ((upper - 1) ** 2 - (g1 * upper) ** 2 - h2 ** 2) / upper;
  const h12 = ((1 - lower) ** 2 - (h1 * lower) ** 2 - g2 ** 2) / lower;
  return {
    low: Math.max(0, a - b - Math.sqrt(Math.max(0, (g1 * a) ** 2 + (h2 * b) ** 2 + g12 * a * b))),
    high: Math.max(0, a - b + Math.sqrt(Math.max(0, (h1 * a) ** 2 + (g2 * b) ** 2 + h12 * a * b))),
  };
}
