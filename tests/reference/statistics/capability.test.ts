import { describe, expect, it } from 'vitest';
import { cpInterval } from '@/lib/statistics/capability/cp-interval';
import { cpkInterval } from '@/lib/statistics/capability/cpk-interval';
import { expectedOutside } from '@/lib/statistics/capability/expected-outside';
import { capabilityIndices } from '@/lib/statistics/capability/indices';
import { oneLimitLowerBound } from '@/lib/statistics/capability/one-limit-lower-bound';
import { percentileCapability } from '@/lib/statistics/capability/percentile-capability';
import { expectedQuantile, sampleQuantile } from '@/lib/statistics/summary/quantiles';
import reference from './capability.json';
import univariate from './nist-strd.json';

const relative = (value: number, expected: number) => Math.abs(value / expected - 1);

describe.each(reference.normal_cases)('capability of $id', (c) => {
  const limits = { min: c.LSL, max: c.USL };
  const indices = capabilityIndices(c.mean, c.s, limits)!;
  it('indices', () => {
    expect(indices.cp).toBeCloseTo(c.Cp, 8);
    expect(indices.lower).toBeCloseTo(c.Cpl, 8);
    expect(indices.upper).toBeCloseTo(c.Cpu, 8);
    expect(indices.cpk).toBeCloseTo(c.Cpk, 8);
  });
  it('interval of Cp, exact', () => {
    const { low, high } = cpInterval(indices.cp!, c.n - 1, c.conf);
    expect(low).toBeCloseTo(c.Cp_lo, 8);
    expect(high).toBeCloseTo(c.Cp_hi, 8);
  });
  it('interval of Cpk, after Bissell', () => {
    const { low, high } = cpkInterval(indices.cpk, c.n, c.n - 1, c.conf);
    expect(low).toBeCloseTo(c.Cpk_lo_two_sided, 8);
    expect(high).toBeCloseTo(c.Cpk_hi_two_sided, 8);
    expect(cpkInterval(indices.cpk, c.n, c.n - 1, 2 * c.conf - 1).low).toBeCloseTo(c.Cpk_lower_one_sided_approx, 8);
  });
  it('lower bound towards one limit, noncentral t', () => {
    const bound = oneLimitLowerBound(indices.cpk, c.n, c.conf);
    expect(bound.kind === 'found' && bound.x).toBeCloseTo(c.one_limit_Ck_lower_one_sided_noncentral_t, 7);
  });
  it('boards in a million beyond the limits', () => {
    const outside = expectedOutside(c.mean, c.s, limits);
    expect(relative(outside.perMillionBelow, c.ppm_below)).toBeLessThan(1e-8);
    expect(relative(outside.perMillionAbove, c.ppm_above)).toBeLessThan(1e-8);
    expect(relative(outside.perMillion, c.ppm_total)).toBeLessThan(1e-8);
  });
});

describe('percentile method', () => {
  /** The cases state no limits; these give their Ppl and Ppu. */
  const limits: Record<string, { min: number; max: number }> = {
    'lognormal_m0.5_s0.3': { min: 0.5, max: 5 },
    'weibull_k1.8_l2': { min: 0, max: 6.5 },
    normal_check: { min: 8.9, max: 9.1 },
  };
  it.each(reference.percentile_cases)('$id', (c) => {
    const percentiles = { low: c['X_0.135'], median: c.X_50, high: c['X_99.865'] };
    const indices = percentileCapability(percentiles, limits[c.id]!)!;
    expect(indices.cp).toBeCloseTo(c.Pp, 7);
    expect(indices.lower).toBeCloseTo(c.Ppl, 7);
    expect(indices.upper).toBeCloseTo(c.Ppu, 7);
    expect(indices.cpk).toBeCloseTo(c.Ppk, 7);
  });
});

describe('sample quantiles of Mavro', () => {
  const { data } = univariate.univariate.find(({ dataset }) => dataset === 'Mavro')!;
  const { p, type6, type7 } = reference.empirical_quantiles.R_quantile;
  it.each(p.map((share, i) => [share, type6[i]!, type7[i]!]))('at %d as R has them', (share, sixth, seventh) => {
    expect(expectedQuantile(data, share)).toBeCloseTo(sixth, 10);
    expect(sampleQuantile(data, share)).toBeCloseTo(seventh, 10);
  });
});
