import { tQuantile } from '../statistics/distributions/student-t';

/**
 * The factor t such that a Student t variable lies within -t to +t with probability `coverage` (0 to 1). JCGM 100:2008,
 * table G.2. `degrees` need not be whole; `Infinity` gives the normal distribution.
 */
export function coverageFactor(coverage: number, degrees: number): number {
  return tQuantile((1 + coverage) / 2, degrees);
}
