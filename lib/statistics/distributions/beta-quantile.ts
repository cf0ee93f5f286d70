import { incompleteBeta } from './incomplete-beta';
import { invertTail } from './invert-tail';

/** The x below which a beta variable of parameters `a`, `b` > 0 lies with probability `p`; throws for p outside 0 to 1. */
export function betaQuantile(p: number, a: number, b: number): number {
  return invertTail(
    (x) => incompleteBeta(x, a, b),
    (x) => incompleteBeta(1 - x, b, a, x),
    p,
    1,
  );
}
