import { describe, expect, it } from 'vitest';
import { combineContributions } from '@/lib/uncertainty/combine';
import { hysteresisBudget, pointBudget } from '@/lib/uncertainty/point-budget';

const meter = { gain: 35e-6, offsetVolts: 0.0004, resolutionVolts: 0.0001 };
const search = (n: number) => Array.from({ length: n }, () => 0.0008);

describe('uncertainty of a point', () => {
  it('holds search, repeats and the meter, with the repeats of few degrees of freedom', () => {
    const budget = pointBudget({ values: [10.8, 10.801, 10.802], searchUncertainties: search(3) }, meter);
    expect(budget.map((c) => [c.name, c.degrees])).toEqual([
      ['search', Infinity],
      ['repeatability', 2],
      ['meter-gain', Infinity],
      ['meter-offset', Infinity],
      ['meter-resolution', Infinity],
    ]);
    expect(budget[0]!.standard).toBeCloseTo(0.0008 / Math.sqrt(3), 9);
    expect(budget[1]!.standard).toBeCloseTo(0.001 / Math.sqrt(3), 9);
    expect(budget[2]!.standard).toBeCloseTo(10.801 * 35e-6, 9);
  });
  it('claims no repeatability from one value', () => {
    const budget = pointBudget({ values: [10.8], searchUncertainties: search(1) }, meter);
    expect(budget.map((c) => c.name)).not.toContain('repeatability');
  });
  it('combines them as independent contributions', () => {
    const budget = pointBudget({ values: [10.8, 10.8003, 10.8006], searchUncertainties: search(3) }, meter);
    const { standard, expanded, coverageFactor } = combineContributions(budget);
    const parts = [0.0008 / Math.sqrt(3), 0.0003 / Math.sqrt(3), 10.8003 * 35e-6, 0.0004, 0.0001 / Math.sqrt(12)];
    expect(standard).toBeCloseTo(Math.hypot(...parts), 9);
    expect(expanded).toBeCloseTo(standard * coverageFactor, 12);
  });
});

describe('uncertainty of hysteresis', () => {
  it('has no offset and a gain on the difference only, since one channel reads both points', () => {
    const budget = hysteresisBudget({ values: [1.5], searchUncertainties: [0.001] }, meter);
    expect(budget.map((c) => c.name)).not.toContain('meter-offset');
    expect(budget.find((c) => c.name === 'meter-gain')!.standard).toBeCloseTo(1.5 * 35e-6, 9);
  });
});
