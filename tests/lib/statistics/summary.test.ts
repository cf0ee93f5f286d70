import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { integrate } from '@/lib/statistics/integrate';
import { exactSum } from '@/lib/statistics/summary/exact-sum';
import { meanOf, pooledDeviation, squaresAboutMean, standardDeviation } from '@/lib/statistics/summary/moments';
import { sampleQuantile, medianOf } from '@/lib/statistics/summary/quantiles';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

describe('exact sum', () => {
  it('is the whole-number sum of any mixture of large and small parts, to one unit in the last place', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 40 }))), (parts) => {
        const exact = parts.reduce((sum, [n, shift]) => sum + BigInt(n) * 2n ** BigInt(shift), 0n);
        const sum = exactSum(parts.map(([n, shift]) => n * 2 ** shift));
        expect(Math.abs(sum - Number(exact))).toBeLessThanOrEqual(Math.abs(Number(exact)) * 2 ** -52);
      }),
    );
  });
  it('forgets nothing that a plain sum would', () => {
    expect(exactSum([1e16, 1, -1e16])).toBe(1);
    expect(exactSum([])).toBe(0);
  });
});

describe('moments', () => {
  it('a constant of nine digits leaves the spread as it is', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: -99, max: 99 }), { minLength: 2, maxLength: 50 }), (values) => {
        expect(squaresAboutMean(values.map((v) => v + 1e9))).toBeCloseTo(squaresAboutMean(values), 5);
      }),
    );
  });
  it('has no deviation of one value, and pools by degrees of freedom', () => {
    expect(standardDeviation([3])).toBeNull();
    expect(Number.isNaN(meanOf([]))).toBe(true);
    expect(pooledDeviation([], [])).toBeNull();
    expect(pooledDeviation([3, 1], [1, 7])).toBeCloseTo(Math.sqrt(2), 12);
  });
  it('quantiles rise with the share and stay within the values', () => {
    const shares = fc.double({ min: 0, max: 1, noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.integer(), { minLength: 1 }), shares, shares, (values, a, b) => {
        const [low, high] = [Math.min(a, b), Math.max(a, b)].map((p) => sampleQuantile(values, p)) as [number, number];
        expect(low).toBeLessThanOrEqual(high + 1e-6);
        expect(low).toBeGreaterThanOrEqual(Math.min(...values));
        expect(high).toBeLessThanOrEqual(Math.max(...values));
      }),
    );
    expect(medianOf([4, 1, 3, 2])).toBe(2.5);
  });
});

describe('integration', () => {
  it('finds smooth, peaked and kinked integrals', () => {
    const cases: [(x: number) => number, number, number, number, number[]][] = [
      [(x) => x ** 9, 0, 2, 102.4, []],
      [(x) => Math.exp(-x * x * 1e4), -1, 1, Math.sqrt(Math.PI) / 100, [0]],
      [(x) => Math.abs(x - 0.3), 0, 1, 0.29, [0.3]],
      [(x) => Math.sqrt(x), 0, 1, 2 / 3, []],
    ];
    for (const [f, from, to, expected, breaks] of cases) {
      const found = integrate(f, from, to, 1e-11, breaks);
      expect(found.kind === 'found' && found.value).toBeCloseTo(expected, 10);
    }
  });
  it('says so when it cannot', () => {
    expect(integrate((x) => 1 / x, 0, 1, 1e-9)).toEqual({ kind: 'notConverged' });
    expect(integrate(() => NaN, 0, 1, 1e-9)).toEqual({ kind: 'notConverged' });
  });
});

describe('Wichmann and Hill', () => {
  it('same seed, same numbers; another seed, others', () => {
    const draw = (seed: number) => Array.from({ length: 20 }, wichmannHill(seed));
    expect(draw(5)).toEqual(draw(5));
    expect(draw(5)).not.toEqual(draw(6));
  });
  it('is uniform in twenty classes and shows no correlation of neighbours, from neighbouring seeds', () => {
    for (const seed of [0, 1, 2, 123_456_789]) {
      const next = wichmannHill(seed);
      const drawn = Array.from({ length: 20_000 }, next);
      const classes = new Array<number>(20).fill(0);
      for (const u of drawn) classes[Math.floor(u * 20)]!++;
      const chiSquare = classes.reduce((sum, n) => sum + (n - 1000) ** 2 / 1000, 0);
      expect(chiSquare).toBeLessThan(43.8); // 99.9 % of chi-squared with 19 degrees of freedom
      const lag = meanOf(drawn.slice(1).map((u, i) => (u - 0.5) * (drawn[i]! - 0.5))) * 12;
      expect(Math.abs(lag)).toBeLessThan(0.025);
      expect(drawn.every((u) => u >= 0 && u < 1)).toBe(true);
    }
  });
});
