import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { andersonDarling } from '@/lib/statistics/capability/anderson-darling';
import { cpInterval } from '@/lib/statistics/capability/cp-interval';
import { capabilityIndices } from '@/lib/statistics/capability/indices';
import { oneLimitLowerBound } from '@/lib/statistics/capability/one-limit-lower-bound';
import { percentileCapability, samplePercentiles } from '@/lib/statistics/capability/percentile-capability';
import { individualsBaseline } from '@/lib/statistics/charts/individuals';
import { movingRangeDegrees } from '@/lib/statistics/charts/moving-range-degrees';
import { meanOf, standardDeviation } from '@/lib/statistics/summary/moments';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

const draws = (n: number, uniform: () => number) => Array.from({ length: n }, () => drawNormal(uniform));
const range = (min: number, max: number) => fc.double({ min, max, noNaN: true });

describe('capability indices', () => {
  it('do not change with shift or unit; Cpk is never over Cp, and equal in the middle', () => {
    fc.assert(
      fc.property(
        range(-2, 2),
        range(0.01, 3),
        range(0.1, 5),
        range(-50, 50),
        range(0.1, 20),
        (mean, sigma, half, shift, scale) => {
          const plain = capabilityIndices(mean, sigma, { min: -half, max: half })!;
          const moved = capabilityIndices(mean * scale + shift, sigma * scale, {
            min: -half * scale + shift,
            max: half * scale + shift,
          })!;
          expect(moved.cpk).toBeCloseTo(plain.cpk, 5);
          expect(plain.cpk).toBeLessThanOrEqual(plain.cp! + 1e-9);
          expect(capabilityIndices(0, sigma, { min: -half, max: half })!.cpk).toBeCloseTo(plain.cp!, 9);
        },
      ),
    );
  });
  it('one limit has no Cp, no limit has nothing, a mean outside is negative', () => {
    expect(capabilityIndices(9, 0.1, { min: 8.7, max: null })).toEqual({
      cp: null,
      lower: expect.closeTo(1, 9),
      upper: null,
      cpk: expect.closeTo(1, 9),
    });
    expect(capabilityIndices(9, 0.1, { min: null, max: null })).toBeNull();
    expect(capabilityIndices(9, 0, { min: 8, max: 10 })).toBeNull();
    expect(capabilityIndices(11, 0.1, { min: 8, max: 10 })!.cpk).toBeLessThan(0);
  });
  it('the exact lower bound covers 95 of 100', () => {
    const uniform = wichmannHill(21);
    let covered = 0;
    for (let i = 0; i < 300; i++) {
      const values = draws(20, uniform);
      const index = capabilityIndices(meanOf(values), standardDeviation(values)!, { min: -3, max: null })!.cpk;
      const bound = oneLimitLowerBound(index, 20);
      if (bound.kind !== 'found') throw new Error(bound.kind);
      if (bound.x <= 1) covered++;
    }
    expect(covered / 300).toBeGreaterThan(0.92);
    expect(covered / 300).toBeLessThan(0.98);
  });
  it("the interval of Cp from a moving range covers with the moving range's own degrees of freedom", () => {
    const uniform = wichmannHill(22);
    let covered = 0;
    for (let i = 0; i < 1000; i++) {
      const baseline = individualsBaseline(draws(30, uniform));
      if (baseline.kind !== 'found') throw new Error(baseline.kind);
      const { low, high } = cpInterval(1 / baseline.sigma, movingRangeDegrees(30));
      if (low <= 1 && 1 <= high) covered++;
    }
    expect(covered).toBeGreaterThan(925);
    expect(covered).toBeLessThan(972);
  });
});

describe('percentile method', () => {
  it('is the usual index for the percentiles of a normal distribution, whatever the shift', () => {
    fc.assert(
      fc.property(range(-5, 5), range(0.1, 3), (mean, sigma) => {
        const percentiles = { low: mean - 3 * sigma, median: mean, high: mean + 3 * sigma };
        const limits = { min: -4, max: 9 };
        const found = percentileCapability(percentiles, limits)!;
        expect(found.cpk).toBeCloseTo(capabilityIndices(mean, sigma, limits)!.cpk, 8);
      }),
    );
  });
  it('says that a small sample only has its extremes, and refuses a spread of nothing', () => {
    const uniform = wichmannHill(4);
    expect(samplePercentiles([])).toBeNull();
    const few = samplePercentiles([3, 1, 2])!;
    expect(few).toEqual({ low: 1, median: 2, high: 3, restsOnExtremes: true });
    expect(samplePercentiles(draws(741, uniform))!.restsOnExtremes).toBe(false);
    expect(percentileCapability({ low: 1, median: 1, high: 1 }, { min: 0, max: 2 })).toBeNull();
  });
});

describe('Anderson and Darling', () => {
  it('does not change with shift and unit', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 1000 }), { minLength: 8, maxLength: 40 }), (values) => {
        const plain = andersonDarling(values);
        const moved = andersonDarling(values.map((v) => 7 * v - 300));
        expect(moved.kind).toBe(plain.kind);
        if (plain.kind === 'found' && moved.kind === 'found') expect(moved.statistic).toBeCloseTo(plain.statistic, 8);
      }),
    );
  });
  it('rejects normal samples as often as its p-value says', () => {
    const uniform = wichmannHill(6);
    const ps = Array.from({ length: 2000 }, () => {
      const found = andersonDarling(draws(40, uniform));
      return found.kind === 'found' ? found.p : NaN;
    });
    for (const level of [0.01, 0.05, 0.1, 0.5]) {
      const share = ps.filter((p) => p < level).length / ps.length;
      expect(Math.abs(share - level)).toBeLessThan(4 * Math.sqrt((level * (1 - level)) / ps.length));
    }
  });
  it('sees a skew and a two-peaked sample', () => {
    const uniform = wichmannHill(8);
    const skew = Array.from({ length: 60 }, () => -Math.log(1 - uniform()));
    const twoPeaks = Array.from({ length: 60 }, (_, i) => drawNormal(uniform) + (i % 2 ? 6 : 0));
    for (const values of [skew, twoPeaks]) {
      const found = andersonDarling(values);
      expect(found.kind === 'found' && found.p).toBeLessThan(0.001);
    }
  });
  it('refuses few values and values that are all alike', () => {
    expect(andersonDarling([1, 2, 3])).toEqual({ kind: 'tooFew', needed: 8 });
    expect(andersonDarling(new Array<number>(9).fill(2))).toEqual({ kind: 'noSpread' });
  });
});
