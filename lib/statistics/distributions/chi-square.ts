import { incompleteGamma } from './incomplete-gamma';
import { invertTail } from './invert-tail';

export const chiSquareBelow = (x: number, degrees: number) => incompleteGamma(degrees / 2, Math.max(0, x) / 2).lower;
export const chiSquareAbove = (x: number, degrees: number) => incompleteGamma(degrees / 2, Math.max(0, x) / 2).upper;

/** The x below which a chi-squared variable of `degrees` > 0 (not necessarily whole) lies with probability `p`. */
export function chiSquareQuantile(p: number, degrees: number): number {
  return invertTail(
    (x) => chiSquareBelow(x, degrees),
    (x) => chiSquareAbove(x, degrees),
    p,
  );
}
