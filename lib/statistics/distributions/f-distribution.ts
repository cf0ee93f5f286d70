import { chiSquareAbove, chiSquareBelow } from './chi-square';
import { incompleteBeta } from './incomplete-beta';
import { invertTail } from './invert-tail';

/** Probability that F of `over` and `under` degrees of freedom lies above `f`; `under` may be Infinity. DLMF 8.17.1, R. A. Fisher. */
export function fAbove(f: number, over: number, under: number): number {
  if (f <= 0) return 1;
  if (under === Infinity) return chiSquareAbove(f * over, over);
  const sum = over * f + under;
  return incompleteBeta(under / sum, under / 2, over / 2, (over * f) / sum);
}

export function fBelow(f: number, over: number, under: number): number {
  if (f <= 0) return 0;
  if (under === Infinity) return chiSquareBelow(f * over, over);
  const sum = over * f + under;
  return incompleteBeta((over * f) / sum, over / 2, under / 2, under / sum);
}

/** The f below which F of `over` and `under` degrees of freedom lies with probability `p`. */
export function fQuantile(p: number, over: number, under: number): number {
  return invertTail(
    (f) => fBelow(f, over, under),
    (f) => fAbove(f, over, under),
    p,
  );
}
