import { tOutside, tQuantile } from '../distributions/student-t';
import { exactSum } from '../summary/exact-sum';
import { meanOf, squaresAboutMean } from '../summary/moments';

export interface Coefficient {
  estimate: number;
  standardError: number;
  /** Probability of so large an estimate when the coefficient is 0. */
  p: number;
}

export type StraightLine =
  | {
      kind: 'found';
      slope: Coefficient;
      intercept: Coefficient;
      /** Of the points about the line, in the unit of y. */
      residualDeviation: number;
      degrees: number;
      rSquared: number;
      /** The line and its confidence band at x. */
      at(x: number): { value: number; low: number; high: number };
    }
  /** Fewer than three points, all x alike, or points exactly on a line, whose uncertainty is then unknown. */
  | { kind: 'tooFew' | 'oneLevel' | 'noSpread' };

/** Least squares of y on x, uncertainty in y only. Sums about the means. NIST/SEMATECH e-Handbook 4.1.4.1, 4.5.1. */
export function straightLine(points: readonly { x: number; y: number }[], confidence = 0.95): StraightLine {
  const n = points.length;
  if (n < 3) return { kind: 'tooFew' };
  const xs = points.map(({ x }) => x);
  const ys = points.map(({ y }) => y);
  const squaresX = squaresAboutMean(xs);
  if (!(squaresX > 0)) return { kind: 'oneLevel' };
  const meanX = meanOf(xs);
  const meanY = meanOf(ys);
  const slope = exactSum(points.map(({ x, y }) => (x - meanX) * (y - meanY))) / squaresX;
  const residuals = points.map(({ x, y }) => y - meanY - slope * (x - meanX));
  const degrees = n - 2;
  const residualSquares = exactSum(residuals.map((e) => e * e));
  const squaresY = squaresAboutMean(ys);
  if (!(residualSquares > squaresY * 1e-28)) return { kind: 'noSpread' };
  const residualDeviation = Math.sqrt(residualSquares / degrees);
  const coefficient = (estimate: number, standardError: number): Coefficient => ({
    estimate,
    standardError,
    p: tOutside(estimate / standardError, degrees),
  });
  const errorAt = (x: number) => residualDeviation * Math.sqrt(1 / n + (x - meanX) ** 2 / squaresX);
  const factor = tQuantile((1 + confidence) / 2, degrees);
  return {
    kind: 'found',
    slope: coefficient(slope, residualDeviation / Math.sqrt(squaresX)),
    intercept: coefficient(meanY - slope * meanX, errorAt(0)),
    residualDeviation,
    degrees,
    rSquared: 1 - residualSquares / squaresY,
    at(x) {
      const value = meanY + slope * (x - meanX);
      return { value, low: value - factor * errorAt(x), high: value + factor * errorAt(x) };
    },
  };
}
