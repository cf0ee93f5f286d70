import { describe, expect, it } from 'vitest';
import fc from 'fast-check';
import { newcombeDifference } from '@/lib/statistics/proportions/newcombe-difference';
import { newcombePaired } from '@/lib/statistics/proportions/newcombe-paired';

/**
 * Values of method 10 in table III of R. G. Newcombe, "Improved confidence intervals for the difference between binomial
 * proportions based on paired data", Statistics in Medicine 17 (1998) 2635-2650; printed to four decimals. From memory.
 */
const published = [
  { both: 36, onlyA: 12, onlyB: 2, neither: 0, low: 0.0569, high: 0.3404 },
  { both: 53, onlyA: 0, onlyB: 0, neither: 1, low: -0.0729, high: 0.0729 },
];

/**
 * Values of method 10 in table II of R. G. Newcombe, "Interval estimation for the difference between independent proportions",
 * Statistics in Medicine 17 (1998) 873-890; printed to four decimals. From memory.
 */
const independent = [
  { a: [56, 70], b: [48, 80], low: 0.0524, high: 0.3339 },
  { a: [9, 10], b: [3, 10], low: 0.1705, high: 0.809 },
  { a: [10, 10], b: [0, 20], low: 0.6791, high: 1 },
] as const;

describe("Newcombe's interval for paired shares", () => {
  it.each(published)('$both, $onlyA, $onlyB, $neither as published', ({ low, high, ...counts }) => {
    const interval = newcombePaired(counts);
    expect(Math.abs(interval.low - low)).toBeLessThan(1e-4);
    expect(Math.abs(interval.high - high)).toBeLessThan(1e-4);
  });

  const cells = fc.nat({ max: 400 });
  const counts = fc
    .record({ both: cells, onlyA: cells, onlyB: cells, neither: cells })
    .filter(({ both, onlyA, onlyB, neither }) => both + onlyA + onlyB + neither > 0);

  it('holds the difference, inside -1 to 1, and mirrors when both are exchanged', () => {
    fc.assert(
      fc.property(counts, (pair) => {
        const { low, high, difference } = newcombePaired(pair);
        expect(low <= difference + 1e-12 && high >= difference - 1e-12 && low >= -1 - 1e-12 && high <= 1 + 1e-12).toBe(
          true,
        );
        const mirrored = newcombePaired({ ...pair, onlyA: pair.onlyB, onlyB: pair.onlyA });
        expect(mirrored.low).toBeCloseTo(-high, 12);
      }),
    );
  });

  it('where pairs agree more than chance, is narrower than for as many boards of each that are not the same', () => {
    const pair = { both: 1850, onlyA: 20, onlyB: 60, neither: 70 };
    const paired = newcombePaired(pair);
    const apart = newcombeDifference({ successes: 1870, trials: 2000 }, { successes: 1910, trials: 2000 });
    expect(paired.high - paired.low).toBeLessThan(0.8 * (apart.high - apart.low));
  });
});

describe("Newcombe's interval for independent shares", () => {
  it.each(independent)('$a against $b as published', ({ a, b, low, high }) => {
    const interval = newcombeDifference({ successes: a[0], trials: a[1] }, { successes: b[0], trials: b[1] });
    expect(Math.abs(interval.low - low)).toBeLessThan(1e-4);
    expect(Math.abs(interval.high - high)).toBeLessThan(1e-4);
  });
});
