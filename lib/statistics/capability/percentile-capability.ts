import { expectedQuantile } from '../summary/quantiles';
import type { CapabilityIndices, SpecificationLimits } from './indices';

/** Values that 0.135 %, half and 99.865 % of the boards stay below: where ±3 sigma would be if the values were normal. */
export interface Percentiles {
  low: number;
  median: number;
  high: number;
}

/** Below this many values the outer percentiles are the sample's own extremes, and the index says too much. */
const enough = Math.ceil(1 / 0.00135);

/** Percentiles straight from the values. `restsOnExtremes` when there are too few for the outer ones; null of none. */
export function samplePercentiles(values: readonly number[]): (Percentiles & { restsOnExtremes: boolean }) | null {
  if (values.length === 0) return null;
  return {
    low: expectedQuantile(values, 0.00135),
    median: expectedQuantile(values, 0.5),
    high: expectedQuantile(values, 0.99865),
    restsOnExtremes: values.length < enough,
  };
}

/** Pp and Ppk of values that are not normal; null without a limit or a spread. ISO 22514-2 (percentile method). */
export function percentileCapability(
  { low, median, high }: Percentiles,
  { min, max }: SpecificationLimits,
): CapabilityIndices | null {
  if ((min === null && max === null) || !(median > low && high > median)) return null;
  const lower = min === null ? null : (median - min) / (median - low);
  const upper = max === null ? null : (max - median) / (high - median);
  return {
    cp: min === null || max === null ? null : (max - min) / (high - low),
    lower,
    upper,
    cpk: Math.min(lower ?? Infinity, upper ?? Infinity),
  };
}
