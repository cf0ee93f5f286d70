import { incompleteBeta } from './incomplete-beta';
import { invertTail } from './invert-tail';
import { normalAbove } from './normal';
import { normalQuantile } from './normal-quantile';

/** Probability that a Student t variable of `degrees` > 0 (Infinity: normal) lies above `t`. DLMF 8.17.1; JCGM 100:2008, C.3.8. */
export function tAbove(t: number, degrees: number): number {
  if (t < 0) return 1 - tAbove(-t, degrees);
  // Above 1e9 the two differ by less than 1e-9 of the tail.
  if (degrees > 1e9) return normalAbove(t);
  const sum = degrees + t * t;
  return 0.5 * incompleteBeta(degrees / sum, degrees / 2, 0.5, (t * t) / sum);
}

/** Probability of a t further from zero than the given one. */
export const tOutside = (t: number, degrees: number) => 2 * tAbove(Math.abs(t), degrees);

/** The t below which a Student t variable of `degrees` lies with probability `p`. */
export function tQuantile(p: number, degrees: number): number {
  if (degrees > 1e9) return normalQuantile(p);
  if (p < 0.5) return -tQuantile(1 - p, degrees);
  return invertTail(
    (t) => 1 - tAbove(t, degrees),
    (t) => tAbove(t, degrees),
    p,
  );
}
