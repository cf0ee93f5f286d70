import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ewmaChart } from '@/lib/statistics/charts/ewma';
import { individualsBaseline, movingRanges, standardised } from '@/lib/statistics/charts/individuals';
import { lotMeansBaseline } from '@/lib/statistics/charts/lot-means';
import { movingRangeDegrees } from '@/lib/statistics/charts/moving-range-degrees';
import { shareBaseline, shareLimits, spreadShareBaseline } from '@/lib/statistics/charts/share-chart';
import { meanAndRangeBaseline } from '@/lib/statistics/charts/subgroups';
import { standardDeviation } from '@/lib/statistics/summary/moments';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

const volts = fc.array(fc.integer({ min: 8000, max: 12000 }), { minLength: 3, maxLength: 40 });
const draws = (n: number, uniform: () => number, centre = 0) =>
  Array.from({ length: n }, () => centre + drawNormal(uniform));

describe('individuals baseline', () => {
  it('moves with a shift and grows with a scale', () => {
    fc.assert(
      fc.property(
        volts,
        fc.integer({ min: -500, max: 500 }),
        fc.integer({ min: 2, max: 9 }),
        (values, shift, scale) => {
          const plain = individualsBaseline(values);
          const moved = individualsBaseline(values.map((v) => v * scale + shift));
          expect(moved.kind).toBe(plain.kind);
          if (plain.kind !== 'found' || moved.kind !== 'found') return;
          expect(moved.individuals.upper).toBeCloseTo(plain.individuals.upper * scale + shift, 6);
          expect(moved.sigma).toBeCloseTo(plain.sigma * scale, 6);
          const z = standardised(values, plain);
          standardised(
            values.map((v) => v * scale + shift),
            moved,
          ).forEach((v, i) => expect(v).toBeCloseTo(z[i]!, 6));
        },
      ),
    );
  });
  it('takes no range across a break between lots', () => {
    expect(movingRanges([1, 2, 10, 11], [2])).toEqual([null, 1, null, 1]);
    const split = individualsBaseline([1, 2, 10, 11], [2]);
    expect(split.kind === 'found' && split.movingRange.centre).toBe(1);
  });
  it('refuses one value, and values that are all alike', () => {
    expect(individualsBaseline([9])).toEqual({ kind: 'tooFew', needed: 2 });
    expect(individualsBaseline([9, 9, 9])).toEqual({ kind: 'noSpread' });
    expect(meanAndRangeBaseline([[1, 2]])).toEqual({ kind: 'tooFew', needed: 2 });
    expect(() => meanAndRangeBaseline([[1, 2], [1]])).toThrow(RangeError);
  });
  it('a moving range is worth the degrees of freedom that its variance says', () => {
    const uniform = wichmannHill(5);
    for (const n of [2, 10, 30]) {
      const sigmas = Array.from({ length: 4000 }, () => {
        const found = individualsBaseline(draws(n, uniform));
        return found.kind === 'found' ? found.sigma : NaN;
      });
      expect(Math.abs(standardDeviation(sigmas)! ** 2 * 2 * movingRangeDegrees(n) - 1)).toBeLessThan(0.1);
    }
    expect(movingRangeDegrees(1001) / 1000).toBeCloseTo(0.605, 2);
  });
});

describe('lots over months', () => {
  it('parts the spread between lots from the spread within', () => {
    const uniform = wichmannHill(3);
    const lots = Array.from({ length: 400 }, () => draws(20, uniform, 2 * drawNormal(uniform)));
    const found = lotMeansBaseline(lots);
    if (found.kind !== 'found') throw new Error(found.kind);
    expect(Math.abs(found.within - 1)).toBeLessThan(0.03);
    expect(Math.abs(found.between / 2 - 1)).toBeLessThan(0.1);
    expect(found.negative).toBe(false);
  });
  it('says when lots differ less than chance would have it', () => {
    const found = lotMeansBaseline([
      [1, 9],
      [9.01, 1],
      [1.01, 9],
    ]);
    expect(found).toMatchObject({ kind: 'found', between: 0, negative: true });
    expect(
      lotMeansBaseline([
        [1, 2],
        [3, 4],
      ]),
    ).toEqual({ kind: 'tooFew', needed: 3 });
  });
});

describe('shares by lot', () => {
  it('allows for spread between lots, and for none where there is none', () => {
    const uniform = wichmannHill(9);
    const lot = (share: number) => ({
      tested: 300,
      defective: Array.from({ length: 300 }, uniform).filter((u) => u < share).length,
    });
    const stable = spreadShareBaseline(Array.from({ length: 200 }, () => lot(0.1)))!;
    expect(Math.abs(stable.overdispersion - 1)).toBeLessThan(0.12);
    const restless = spreadShareBaseline(Array.from({ length: 200 }, () => lot(0.05 + 0.1 * uniform())))!;
    expect(restless.overdispersion).toBeGreaterThan(1.5);
  });
  it('has no limit that cannot be crossed', () => {
    expect(shareBaseline([{ defective: 0, tested: 0 }])).toBeNull();
    expect(spreadShareBaseline([{ defective: 1, tested: 9 }])).toBeNull();
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), fc.integer({ min: 1, max: 500 }), (share, tested) => {
        const { lower, upper } = shareLimits({ share, overdispersion: 1 }, tested);
        expect(lower === null || (lower > 0 && lower <= share)).toBe(true);
        expect(upper === null || (upper < 1 && upper >= share)).toBe(true);
      }),
    );
  });
});

describe('EWMA', () => {
  it('with all weight on the newest value is the individuals chart', () => {
    fc.assert(
      fc.property(volts, (values) => {
        const chart = ewmaChart(values, { lambda: 1, target: 10_000, sigma: 10, width: 3 });
        expect(chart.averages).toEqual(values);
        expect(chart.steady).toEqual({ centre: 10_000, lower: 9970, upper: 10_030 });
        chart.limits.forEach((limit) => expect(limit).toEqual(chart.steady));
      }),
    );
  });
});
