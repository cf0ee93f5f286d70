import { describe, expect, it } from 'vitest';
import { lotViewQuery, lotViewSchema } from '@/lib/contracts/lot-view';
import { firstBoardsBaseline } from '@/lib/quality/frozen-baseline';
import { reviewLot, type ReviewQuestion } from '@/lib/quality/review-lot';
import { normalQuantile } from '@/lib/statistics/distributions/normal-quantile';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { allOf, board } from './boards';

const limits = { min: 10.7, max: 10.9, guardedMin: 10.704, guardedMax: 10.896 };
const story = { frozenAt: new Date('2026-11-30T08:00:00Z'), fromLots: [], byName: null };

function question(size: number, shiftedFrom = Infinity): ReviewQuestion {
  const uniform = wichmannHill(11);
  const values = Array.from(
    { length: size },
    (_, i) => 10.8 + 0.015 * normalQuantile(uniform() || 0.5) + (i >= shiftedFrom ? 0.05 : 0),
  );
  const figures = firstBoardsBaseline(values);
  return {
    view: lotViewSchema.parse({}),
    size,
    boards: values.map((value, i) => board({ values: allOf(value), stationCode: i % 2 ? 'S1' : 'S2' })),
    withoutVerdict: [],
    components: [],
    shifts: { timeZone: 'UTC', shiftStarts: ['06:00'] },
    limits: { 'trip-volts': limits },
    baselines: { 'trip-volts': figures && { ...figures, ...story } },
  };
}

describe('the review of a lot', () => {
  it('calls a shifted lot not stable by the chosen rules only', () => {
    const shifted = question(120, 90);
    const review = reviewLot(shifted);
    expect(review.quoted.trip).toMatchObject({ stable: false });
    expect(review.stretches.find(({ rule }) => rule === 2)!.to).toBe(120);
    const none = reviewLot({ ...shifted, view: lotViewSchema.parse({ rules: '' }) });
    expect(none.quoted.trip).toMatchObject({ stable: true });
    expect(none.broken[2]).toBeGreaterThan(0);
    expect(none.stretches).toEqual([]);
  });

  it('has no control limits and no rules before the baseline, and says how many boards are there', () => {
    const review = reviewLot(question(12));
    expect(review.baseline).toEqual({ kind: 'waiting', values: 12, needed: 30 });
    expect(review.stretches).toEqual([]);
  });

  it('quotes percentiles where the values are not normal', () => {
    const shifted = reviewLot(question(200, 120));
    expect(shifted.quoted.trip).toMatchObject({ method: 'percentile' });
    expect(reviewLot(question(200)).quoted.trip).toMatchObject({ method: 'normal' });
  });

  it('quotes the same index of a quantity whether or not its chart is shown', () => {
    const asked = question(200, 150);
    const both = {
      ...asked,
      limits: { 'trip-volts': limits, 'release-volts': limits },
      baselines: { ...asked.baselines, 'release-volts': asked.baselines['trip-volts'] },
    };
    const { trip, release } = reviewLot(both).quoted;
    expect(release).toEqual(trip);
  });

  it('has no capability where the specification has no limits', () => {
    const asked = question(40);
    expect(reviewLot({ ...asked, limits: {} })).toMatchObject({
      capability: { kind: 'noLimits' },
      quoted: { trip: null },
    });
  });

  it('falls back to stations for a comparison that the lot does not know', () => {
    const asked = { ...question(40), view: { ...lotViewSchema.parse({}), compare: 'batch:gone' } };
    expect(reviewLot(asked).comparison.factor).toBe('station');
  });

  it('takes well under 300 ms for 5,000 boards', () => {
    const asked = question(5_000, 4_500);
    reviewLot(asked);
    const started = performance.now();
    const review = reviewLot(asked);
    expect(performance.now() - started).toBeLessThan(300);
    expect(review.points.values).toHaveLength(5_000);
  });
});

describe('the address of a lot', () => {
  it('leaves out what is shown anyway and brings everything else back', () => {
    const usual = lotViewSchema.parse({});
    expect(lotViewQuery(usual)).toBe('');
    const view = {
      ...usual,
      quantity: 'release-volts',
      rules: [1, 5],
      compare: 'batch:RV1 trimmer',
      page: 3,
      order: 'falling',
    } as const;
    expect(
      lotViewSchema.parse(Object.fromEntries(new URLSearchParams(lotViewQuery({ ...view, rules: [1, 5] })))),
    ).toEqual(view);
    expect(lotViewSchema.parse({ rules: '' }).rules).toEqual([]);
  });

  it('falls back part by part from anything it does not know', () => {
    expect(
      lotViewSchema.parse({ quantity: 'x', rules: '9,1', page: '-2', sort: 'hack', boards: 'rejected' }),
    ).toMatchObject({
      quantity: 'trip-volts',
      rules: [1, 2],
      page: 1,
      sort: 'position',
      boards: 'rejected',
    });
  });
});
