import { meanOf, pooledDeviation, standardDeviation } from '../summary/moments';
import { individualsBaseline, type IndividualsBaseline } from './individuals';
import type { NoBaseline } from './limits';

export interface LotMeansBaseline {
  kind: 'found';
  /** Lot means as individuals, so that the usual spread from lot to lot is inside the limits. */
  means: IndividualsBaseline;
  /** Pooled standard deviation within the lots. */
  within: number;
  /** Standard deviation from lot to lot beyond what the spread within explains; 0 when `negative`. */
  between: number;
  /** The estimate of the variance between lots came out negative: no such spread is seen. */
  negative: boolean;
}

/**
 * Limits for drift over many lots, each a list of values in time order. A chart with limits from the spread within lots
 * would call every second lot out of control. At least three lots of two. NIST/SEMATECH e-Handbook 6.3.2.2 on the means;
 * D. J. Wheeler, "three-way" charts.
 */
export function lotMeansBaseline(lots: readonly (readonly number[])[]): LotMeansBaseline | NoBaseline {
  const usable = lots.filter((lot) => lot.length >= 2);
  if (usable.length < 3) return { kind: 'tooFew', needed: 3 };
  const means = individualsBaseline(usable.map(meanOf));
  if (means.kind !== 'found') return means;
  const within = pooledDeviation(
    usable.map((lot) => standardDeviation(lot)!),
    usable.map((lot) => lot.length - 1),
  )!;
  const ofMeans = within ** 2 * meanOf(usable.map((lot) => 1 / lot.length));
  const between = means.sigma ** 2 - ofMeans;
  return { kind: 'found', means, within, between: Math.sqrt(Math.max(0, between)), negative: between < 0 };
}
