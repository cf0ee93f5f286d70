import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clopperPearson } from '@/lib/statistics/proportions/clopper-pearson';
import { newcombeDifference } from '@/lib/statistics/proportions/newcombe-difference';
import { wilson } from '@/lib/statistics/proportions/wilson';
import { rolledThroughputYield, yieldOf } from '@/lib/statistics/proportions/yields';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

const counts = fc
  .integer({ min: 1, max: 3000 })
  .chain((trials) => fc.record({ trials: fc.constant(trials), successes: fc.integer({ min: 0, max: trials }) }));

describe.each([
  ['exact', clopperPearson],
  ['by scores', wilson],
])('interval of a share, %s', (_, interval) => {
  it('holds the share, mirrors with it, and widens with confidence', () => {
    fc.assert(
      fc.property(counts, ({ trials, successes }) => {
        const { low, high } = interval(successes, trials);
        expect(low >= 0 && low <= successes / trials && high >= successes / trials && high <= 1).toBe(true);
        const mirrored = interval(trials - successes, trials);
        expect(mirrored.low).toBeCloseTo(1 - high, 12);
        const wider = interval(successes, trials, 0.99);
        expect(wider.low <= low && wider.high >= high).toBe(true);
      }),
    );
  });
  it('refuses what is no count', () => {
    for (const [successes, trials] of [
      [3, 2],
      [-1, 5],
      [0, 0],
      [1.5, 3],
    ])
      expect(() => interval(successes!, trials!)).toThrow(RangeError);
  });
});

describe('coverage over all outcomes of 30 boards', () => {
  const n = 30;
  const chance = (p: number) => {
    const weights = [(1 - p) ** n];
    for (let k = 1; k <= n; k++) weights.push((weights[k - 1]! * (n - k + 1) * p) / (k * (1 - p)));
    return weights;
  };
  const coverages = (interval: typeof wilson) => {
    const intervals = Array.from({ length: n + 1 }, (_, k) => interval(k, n));
    return Array.from({ length: 99 }, (_, i) => {
      const p = (i + 1) / 100;
      return chance(p).reduce((sum, w, k) => sum + (intervals[k]!.low <= p && p <= intervals[k]!.high ? w : 0), 0);
    });
  };
  it('the exact one never covers less than 95 %', () => {
    for (const coverage of coverages(clopperPearson)) expect(coverage).toBeGreaterThan(0.95 - 1e-12);
  });
  it("Wilson's covers 95 % on the mean", () => {
    const all = coverages(wilson);
    expect(Math.abs(all.reduce((sum, c) => sum + c, 0) / all.length - 0.95)).toBeLessThan(0.01);
  });
});

describe('difference of shares', () => {
  it('changes its sign with the order, and holds 0 for equal counts', () => {
    fc.assert(
      fc.property(counts, counts, (a, b) => {
        const ab = newcombeDifference(a, b);
        const ba = newcombeDifference(b, a);
        expect(ab.low).toBeCloseTo(-ba.high, 12);
        expect(ab.low <= ab.difference && ab.difference <= ab.high).toBe(true);
        const none = newcombeDifference(a, a);
        expect(none.low <= 0 && none.high >= 0).toBe(true);
      }),
    );
  });
});

describe('yields', () => {
  it('nothing tested has no yield', () => {
    expect(yieldOf(0, 0, 'wilson')).toBeNull();
    expect(rolledThroughputYield([])).toBeNull();
    expect(
      rolledThroughputYield([
        { entered: 5, passedFirst: 5 },
        { entered: 0, passedFirst: 0 },
      ]),
    ).toBeNull();
  });
  it('one operation has its own first-pass yield and Wilson limits', () => {
    fc.assert(
      fc.property(counts, ({ trials, successes }) => {
        const rolled = rolledThroughputYield([{ entered: trials, passedFirst: successes }])!;
        const plain = yieldOf(successes, trials, 'wilson')!;
        expect(rolled.share).toBeCloseTo(plain.share, 12);
        expect(rolled.low).toBeCloseTo(plain.low, 12);
        expect(rolled.high).toBeCloseTo(plain.high, 12);
      }),
    );
  });
  it('rolls operations up: 0.98 × 0.95 × 0.99', () => {
    const operations = [98, 95, 99].map((passedFirst) => ({ entered: 100, passedFirst }));
    expect(rolledThroughputYield(operations)!.share).toBeCloseTo(0.98 * 0.95 * 0.99, 12);
  });
  it('covers the true rolled yield in some 95 of 100 lots', () => {
    const uniform = wichmannHill(2);
    const truths = [0.97, 0.9, 0.98];
    const truth = truths.reduce((product, p) => product * p, 1);
    const covered = Array.from({ length: 1000 }, () => {
      const operations = truths.map((p) => ({
        entered: 120,
        passedFirst: Array.from({ length: 120 }, uniform).filter((u) => u < p).length,
      }));
      const { low, high } = rolledThroughputYield(operations)!;
      return low <= truth && truth <= high;
    }).filter(Boolean).length;
    expect(covered).toBeGreaterThan(925);
    expect(covered).toBeLessThan(980);
  });
});
