import { incompleteBeta } from './incomplete-beta';

/** Probability that a Student t variable of `degrees` (> 0) degrees of freedom lies above `t` >= 0. */
function upperTail(t: number, degrees: number): number {
  return 0.5 * incompleteBeta(degrees / (degrees + t * t), degrees / 2, 0.5);
}

/**
 * The factor t such that a Student t variable lies within -t to +t with probability `coverage` (0 to 1). JCGM 100:2008,
 * table G.2. `degrees` need not be whole; `Infinity` gives the normal distribution to 1e-8.
 */
export function coverageFactor(coverage: number, degrees: number): number {
  const nu = Math.min(degrees, 1e8);
  const tail = (1 - coverage) / 2;
  let low = 0;
  let high = 1;
  while (upperTail(high, nu) > tail) high *= 2;
  while (high - low > 1e-12 * high) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (upperTail(middle, nu) > tail) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
