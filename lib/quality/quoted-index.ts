import type { ReviewLimits } from '../contracts/lot-review';
import { andersonDarling } from '../statistics/capability/anderson-darling';
import type { CapabilityResult } from '../statistics/capability/capability-study';
import { capabilityIndices } from '../statistics/capability/indices';
import { percentileCapability, samplePercentiles } from '../statistics/capability/percentile-capability';
import { individualsBaseline } from '../statistics/charts/individuals';
import { meanOf } from '../statistics/summary/moments';

/** As in a capability study. */
const doubtBelow = 0.05;

type Quoted = { index: number; method: 'normal' | 'percentile' };

/** Which index a study quotes; null where it has none. */
export function quotedOfStudy(study: CapabilityResult): Quoted | null {
  if (study.kind !== 'found') return null;
  const index = study.quoted === 'percentile' ? study.percentile?.cpk : study.shortTerm?.cpk;
  return index === undefined ? null : { index, method: study.quoted };
}

/** The same straight from the values, without the intervals that take most of a study's time. */
export function quotedOfValues(values: readonly number[], limits: ReviewLimits | null): Quoted | null {
  if (!limits || values.length < 2) return null;
  const normality = andersonDarling(values);
  if (normality.kind === 'found' && normality.p < doubtBelow) {
    const percentiles = samplePercentiles(values);
    const byPercentiles = percentiles && percentileCapability(percentiles, limits);
    return byPercentiles && { index: byPercentiles.cpk, method: 'percentile' };
  }
  const baseline = individualsBaseline(values);
  const indices = baseline.kind === 'found' ? capabilityIndices(meanOf(values), baseline.sigma, limits) : null;
  return indices && { index: indices.cpk, method: 'normal' };
}
