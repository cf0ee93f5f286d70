import { individualsBaseline } from '../charts/individuals';
import { movingRangeDegrees } from '../charts/moving-range-degrees';
import { meanOf, standardDeviation } from '../summary/moments';
import { andersonDarling, type NormalityTest } from './anderson-darling';
import { cpInterval } from './cp-interval';
import { cpkInterval } from './cpk-interval';
import { capabilityIndices, type CapabilityIndices, type SpecificationLimits } from './indices';
import { percentileCapability, samplePercentiles } from './percentile-capability';

interface Interval {
  low: number;
  high: number;
}

export interface Capability extends CapabilityIndices {
  /** Null with one limit, like `cp`. */
  cpInterval: Interval | null;
  cpkInterval: Interval;
}

export interface CapabilityStudy {
  kind: 'found';
  count: number;
  mean: number;
  /** Cp and Cpk from the moving range; null where that shows no spread. */
  shortTerm: Capability | null;
  /** Pp and Ppk from the standard deviation of all values. */
  longTerm: Capability;
  normality: NormalityTest;
  /** Which to quote: percentiles where normality is in doubt, and the intervals above do not hold then. */
  quoted: 'normal' | 'percentile';
  percentile: (CapabilityIndices & { restsOnExtremes: boolean }) | null;
}

export type CapabilityResult = CapabilityStudy | { kind: 'tooFew' | 'noSpread' | 'noLimits' };

/**
 * Capability of values in time order against the specification. `doubtBelow`: the p-value of the normality test under which
 * the percentile method is to be quoted. Says nothing of stability: beside an unstable chart no index means anything yet.
 */
export function capabilityStudy(
  values: readonly number[],
  limits: SpecificationLimits,
  { confidence = 0.95, doubtBelow = 0.05, breaksBefore = [] as readonly number[] } = {},
): CapabilityResult {
  const sigma = standardDeviation(values);
  if (sigma === null) return { kind: 'tooFew' };
  if (limits.min === null && limits.max === null) return { kind: 'noLimits' };
  if (!(sigma > 0)) return { kind: 'noSpread' };
  const mean = meanOf(values);
  const count = values.length;
  const withIntervals = (spread: number, degrees: number): Capability => {
    const indices = capabilityIndices(mean, spread, limits)!;
    return {
      ...indices,
      cpInterval: indices.cp === null ? null : cpInterval(indices.cp, degrees, confidence),
      cpkInterval: cpkInterval(indices.cpk, count, degrees, confidence),
    };
  };
  const baseline = individualsBaseline(values, breaksBefore);
  const normality = andersonDarling(values);
  const percentiles = samplePercentiles(values)!;
  const byPercentiles = percentileCapability(percentiles, limits);
  const inDoubt = normality.kind === 'found' && normality.p < doubtBelow;
  return {
    kind: 'found',
    count,
    mean,
    shortTerm:
      baseline.kind === 'found' ? withIntervals(baseline.sigma, movingRangeDegrees(count - breaksBefore.length)) : null,
    longTerm: withIntervals(sigma, count - 1),
    normality,
    quoted: inDoubt ? 'percentile' : 'normal',
    percentile: byPercentiles && { ...byPercentiles, restsOnExtremes: percentiles.restsOnExtremes },
  };
}
