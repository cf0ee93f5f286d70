import type { ChartLimits } from './limits';

export interface LotCount {
  defective: number;
  tested: number;
}

export interface ShareBaseline {
  /** Mean share of defectives of the baseline, 0 to 1. */
  share: number;
  /** Spread between lots over the binomial one; 1 where the p chart needs no such correction. */
  overdispersion: number;
}

/**
 * Baseline of a p chart: total defectives over total tested; null when nothing was tested. NIST/SEMATECH e-Handbook 6.3.3.2.
 */
export function shareBaseline(lots: readonly LotCount[]): ShareBaseline | null {
  const tested = lots.reduce((sum, lot) => sum + lot.tested, 0);
  if (tested === 0) return null;
  return { share: lots.reduce((sum, lot) => sum + lot.defective, 0) / tested, overdispersion: 1 };
}

/**
 * The same with the spread from lot to lot allowed for: sigma of the standardised shares from their moving range. Null with
 * fewer than two lots, or a share of 0 or 1. D. B. Laney, Quality Engineering 14 (2002), p' chart.
 */
export function spreadShareBaseline(lots: readonly LotCount[]): ShareBaseline | null {
  const plain = shareBaseline(lots);
  const tested = lots.filter((lot) => lot.tested > 0);
  if (!plain || tested.length < 2 || plain.share === 0 || plain.share === 1) return null;
  const z = tested.map((lot) => (lot.defective / lot.tested - plain.share) / binomialSigma(plain.share, lot.tested));
  const ranges = z.slice(1).map((value, i) => Math.abs(value - z[i]!));
  const meanRange = ranges.reduce((sum, range) => sum + range, 0) / ranges.length;
  return { ...plain, overdispersion: (meanRange * Math.sqrt(Math.PI)) / 2 };
}

const binomialSigma = (share: number, tested: number) => Math.sqrt((share * (1 - share)) / tested);

/** Limits for a lot of `tested` boards: share ± 3 sigma, none below 0 or above 1. */
export function shareLimits({ share, overdispersion }: ShareBaseline, tested: number): ChartLimits {
  const reach = 3 * overdispersion * binomialSigma(share, tested);
  return {
    centre: share,
    lower: share - reach > 0 ? share - reach : null,
    upper: share + reach < 1 ? share + reach : null,
  };
}
