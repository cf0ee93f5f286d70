import { normalBelow } from '../statistics/distributions/normal';
import { normalQuantile } from '../statistics/distributions/normal-quantile';
import { standardOf, type BudgetLine } from './budget-line';

/** Uniform in [0, 1). */
export type Uniform = () => number;

/** Standard normal; 0 is moved to where 32 bits would round to it. */
export const drawNormal = (uniform: Uniform) => normalQuantile(uniform() || 2 ** -33);

/** Chi-squared of `degrees` > 0, not necessarily whole. Marsaglia and Tsang, ACM Trans. Math. Softw. 26 (2000). */
export function drawChiSquare(degrees: number, uniform: Uniform): number {
  if (degrees < 2) return drawChiSquare(degrees + 2, uniform) * uniform() ** (2 / degrees);
  const d = degrees / 2 - 1 / 3;
  for (;;) {
    const x = drawNormal(uniform);
    const v = (1 + x / Math.sqrt(9 * d)) ** 3;
    if (v > 0 && Math.log(1 - uniform()) < (x * x) / 2 + d - d * v + d * Math.log(v)) return 2 * d * v;
  }
}

/**
 * A deviation of a budget row's contributor from its estimate, in its own unit. `correlated` is a standard normal number
 * that carries the row's correlation, null for an independent row. Estimated from repeats: a scaled t (JCGM 101:2008,
 * 6.4.9); others 6.4.2 to 6.4.7.
 */
export function drawDeviation(line: BudgetLine, correlated: number | null, uniform: Uniform): number {
  if (line.distribution === 'normal') {
    const normal = correlated ?? drawNormal(uniform);
    const scale = Number.isFinite(line.degrees) ? Math.sqrt(line.degrees / drawChiSquare(line.degrees, uniform)) : 1;
    return standardOf(line) * normal * scale;
  }
  const p = correlated === null ? uniform() : normalBelow(correlated);
  switch (line.distribution) {
    case 'rectangular':
      return line.spread * (2 * p - 1);
    case 'triangular':
      return line.spread * (p < 0.5 ? Math.sqrt(2 * p) - 1 : 1 - Math.sqrt(2 * (1 - p)));
    case 'u-shaped':
      return -line.spread * Math.cos(Math.PI * p);
  }
}
