import { fAbove } from '../distributions/f-distribution';
import { exactSum } from '../summary/exact-sum';
import { meanOf, squaresAboutMean } from '../summary/moments';

export interface OneWayAnova {
  kind: 'found';
  degreesBetween: number;
  degreesWithin: number;
  squaresBetween: number;
  squaresWithin: number;
  meanSquareBetween: number;
  meanSquareWithin: number;
  f: number;
  /** Probability of so large an F when the groups do not differ. */
  p: number;
  rSquared: number;
  /** Residual standard deviation, in the unit of the values. */
  residualDeviation: number;
}

/** `noSpread`: all values within every group are alike, so that F has no meaning. */
export type OneWayResult = OneWayAnova | { kind: 'tooFew' } | { kind: 'noSpread' };

/**
 * One-way analysis of variance of groups of readings, of equal size or not; empty groups are left out. `tooFew` with fewer
 * than two groups or no group of two. The first value is subtracted from all before anything is squared, and sums are
 * exact, so many constant leading digits cost nothing. NIST/SEMATECH e-Handbook 7.4.3.
 */
export function oneWayAnova(groups: readonly (readonly number[])[]): OneWayResult {
  const filled = groups.filter((group) => group.length > 0);
  const total = filled.reduce((n, group) => n + group.length, 0);
  const degreesBetween = filled.length - 1;
  const degreesWithin = total - filled.length;
  if (degreesBetween < 1 || degreesWithin < 1) return { kind: 'tooFew' };
  const origin = filled[0]![0]!;
  const centred = filled.map((group) => group.map((value) => value - origin));
  const grandMean = meanOf(centred.flat());
  const squaresBetween = exactSum(centred.map((group) => group.length * (meanOf(group) - grandMean) ** 2));
  const squaresWithin = exactSum(centred.map(squaresAboutMean));
  if (!(squaresWithin > 0)) return { kind: 'noSpread' };
  const meanSquareBetween = squaresBetween / degreesBetween;
  const meanSquareWithin = squaresWithin / degreesWithin;
  const f = meanSquareBetween / meanSquareWithin;
  return {
    kind: 'found',
    degreesBetween,
    degreesWithin,
    squaresBetween,
    squaresWithin,
    meanSquareBetween,
    meanSquareWithin,
    f,
    p: fAbove(f, degreesBetween, degreesWithin),
    rSquared: squaresBetween / (squaresBetween + squaresWithin),
    residualDeviation: Math.sqrt(meanSquareWithin),
  };
}
