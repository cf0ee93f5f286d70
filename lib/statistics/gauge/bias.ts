import { tOutside, tQuantile } from '../distributions/student-t';
import { meanOf, standardDeviation } from '../summary/moments';

export type Bias =
  | {
      kind: 'found';
      /** Mean reading less the reference value, its standard error and its interval, in the unit of the readings. */
      bias: number;
      standardError: number;
      low: number;
      high: number;
      t: number;
      degrees: number;
      /** Probability of so large a bias when there is none. */
      p: number;
      significant: boolean;
    }
  | { kind: 'tooFew' | 'noSpread' };

/**
 * Bias of repeated readings of a reference board. `referenceStandard` is the standard uncertainty of its value: it widens the
 * interval of the bias and counts in the test. AIAG MSA, 4th ed., III B (independent sample method).
 */
export function biasOf(
  readings: readonly number[],
  reference: number,
  { confidence = 0.95, referenceStandard = 0 } = {},
): Bias {
  const deviation = standardDeviation(readings);
  if (deviation === null) return { kind: 'tooFew' };
  if (!(deviation > 0)) return { kind: 'noSpread' };
  const bias = meanOf(readings.map((reading) => reading - reference));
  const ofMean = deviation / Math.sqrt(readings.length);
  const standardError = Math.hypot(ofMean, referenceStandard);
  // Welch and Satterthwaite, the reference value of infinite degrees of freedom.
  const degrees = (readings.length - 1) * (standardError / ofMean) ** 4;
  const t = bias / standardError;
  const half = tQuantile((1 + confidence) / 2, degrees) * standardError;
  const p = tOutside(t, degrees);
  return {
    kind: 'found',
    bias,
    standardError,
    low: bias - half,
    high: bias + half,
    t,
    degrees,
    p,
    significant: p < 1 - confidence,
  };
}
