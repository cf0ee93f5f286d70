import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { combineBudget, type Budget, type BudgetResult } from '@/lib/uncertainty/budget';
import { budgetAgreement } from '@/lib/uncertainty/budget-agreement';
import { halfWidthDivisor, lineOf, type BudgetLine } from '@/lib/uncertainty/budget-line';
import { combineContributions } from '@/lib/uncertainty/combine';
import { choleskyFactor } from '@/lib/uncertainty/correlation';
import { definitionLines, definitionTerms } from '@/lib/uncertainty/definition-terms';
import { hysteresisBudget, pointBudget } from '@/lib/uncertainty/point-budget';
import { monteCarloBudget } from '@/lib/uncertainty/monte-carlo';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

function found(result: BudgetResult): Budget {
  if (result.kind !== 'found') throw new Error(result.kind);
  return result;
}

const normal = (contributor: string, standard: number, sensitivity = 1, degrees = Infinity): BudgetLine => ({
  contributor,
  distribution: 'normal',
  spread: standard,
  divisor: 1,
  sensitivity,
  degrees,
});

const meter = { gain: 35e-6, offsetVolts: 0.0004, resolutionVolts: 0.0001 };

describe('budget table', () => {
  it('combines the contributions of a point as the run does', () => {
    const contributions = pointBudget({ values: [10.8, 10.801, 10.8], searchUncertainties: [8e-4, 8e-4, 8e-4] }, meter);
    const { kind: _, rows, degreesAreCautious, ...combined } = found(combineBudget(contributions.map(lineOf)));
    const expected = combineContributions(contributions);
    expect(combined.effectiveDegrees).toBe(expected.effectiveDegrees);
    expect(combined.expanded).toBeCloseTo(expected.expanded, 14);
    expect(degreesAreCautious).toBe(false);
    expect(rows.find(({ contributor }) => contributor === 'meter-gain')!.divisor).toBe(Math.sqrt(3));
  });
  it('shares add up to 1, with correlations too, and no contribution makes it smaller', () => {
    const lines = fc.array(fc.tuple(fc.double({ min: 1e-6, max: 10, noNaN: true }), fc.constantFrom(-2, -1, 1, 3)), {
      minLength: 2,
      maxLength: 6,
    });
    fc.assert(
      fc.property(lines, fc.double({ min: -1, max: 1, noNaN: true }), (parts, coefficient) => {
        const rows = parts.map(([u, c], i) => normal(`x${i}`, u, c));
        const plain = found(combineBudget(rows));
        expect(found(combineBudget([...rows, normal('more', 0.5)])).standard).toBeGreaterThan(plain.standard);
        const joined = found(combineBudget(rows, [{ between: ['x0', 'x1'], coefficient }]));
        if (joined.standard > 1e-9) expect(joined.rows.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
        expect(joined.standard).toBeLessThanOrEqual(parts.reduce((sum, [u, c]) => sum + Math.abs(u * c), 0) + 1e-9);
      }),
    );
  });
  it('the gain common to trip and release cancels in hysteresis: the rows with correlation 1 are the budget of the difference', () => {
    const gain = 35e-6;
    const [trip, release] = [9.3, 10.8];
    const rows = [normal('gain at trip', trip * gain, -1), normal('gain at release', release * gain, 1)];
    const together = found(combineBudget(rows, [{ between: ['gain at trip', 'gain at release'], coefficient: 1 }]));
    const alone = hysteresisBudget({ values: [release - trip], searchUncertainties: [0] }, meter);
    expect(together.standard).toBeCloseTo(alone.find(({ name }) => name === 'meter-gain')!.standard, 12);
    expect(found(combineBudget(rows)).standard).toBeGreaterThan(8 * together.standard);
    expect(together.rows.some(({ share }) => share < 0)).toBe(true);
  });
  it('correlated rows of few degrees count as one with the fewest, and it is said', () => {
    const rows = [normal('a', 1, 1, 4), normal('b', 1, 1, 9), normal('c', 1)];
    const joined = found(combineBudget(rows, [{ between: ['a', 'b'], coefficient: 1 }]));
    expect(joined.degreesAreCautious).toBe(true);
    // (2² + 1)² / (2⁴/4) = 6.25
    expect(joined.effectiveDegrees).toBe(6);
    expect(found(combineBudget(rows)).degreesAreCautious).toBe(false);
  });
  it('refuses correlations that contradict each other, and names that are in no row', () => {
    const rows = ['a', 'b', 'c'].map((name) => normal(name, 1));
    const pairs = [
      ['a', 'b'],
      ['b', 'c'],
      ['a', 'c'],
    ] as const;
    const impossible = pairs.map((between, i) => ({ between, coefficient: i === 2 ? -0.9 : 0.9 }));
    expect(combineBudget(rows, impossible)).toEqual({ kind: 'contradiction' });
    expect(
      monteCarloBudget({ value: 0, lines: rows, correlations: impossible, trials: 1000, uniform: wichmannHill(1) }),
    ).toEqual({ kind: 'contradiction' });
    expect(() => combineBudget(rows, [{ between: ['a', 'z'], coefficient: 0.5 }])).toThrow(RangeError);
  });
  it('a budget of nothing is 0, not NaN', () => {
    expect(found(combineBudget([]))).toMatchObject({ standard: 0, expanded: 0, effectiveDegrees: Infinity });
    expect(found(combineBudget([normal('none', 0, 1, 5)])).rows[0]!.share).toBe(0);
  });
});

describe('Cholesky factor', () => {
  it('gives the matrix back, singular ones too', () => {
    const vectors = fc.array(fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 2, maxLength: 2 }), {
      minLength: 1,
      maxLength: 4,
    });
    fc.assert(
      fc.property(vectors, (v) => {
        const long = v.map(([x, y]) =>
          Math.hypot(x!, y!) > 0.1 ? [x! / Math.hypot(x!, y!), y! / Math.hypot(x!, y!)] : [1, 0],
        );
        const matrix = long.map((a) => long.map((b) => a[0]! * b[0]! + a[1]! * b[1]!));
        const factor = choleskyFactor(matrix);
        // Two dimensions only, so from the third row on the matrix is singular: rounding may pass or fail it, never falsify it.
        if (!factor) return;
        matrix.forEach((row, i) =>
          row.forEach((value, j) => {
            expect(factor[i]!.reduce((sum, l, k) => sum + l * factor[j]![k]!, 0)).toBeCloseTo(value, 5);
          }),
        );
      }),
    );
    expect(
      choleskyFactor([
        [1, 1],
        [1, 1],
      ]),
    ).toEqual([
      [1, 0],
      [1, 0],
    ]);
    expect(
      choleskyFactor([
        [1, 1.1],
        [1.1, 1],
      ]),
    ).toBeNull();
  });
});

describe('simulation of a budget', () => {
  const uniform = () => wichmannHill(42);
  it.each(['rectangular', 'triangular', 'u-shaped'] as const)('%s: its divisor is right', (distribution) => {
    const line: BudgetLine = { ...normal('x', 1), distribution, divisor: halfWidthDivisor[distribution] };
    const simulated = monteCarloBudget({ value: 3, lines: [line], trials: 20_000, uniform: uniform() });
    if (simulated.kind !== 'found') throw new Error(simulated.kind);
    expect(simulated.standard).toBeCloseTo(1 / halfWidthDivisor[distribution], 1.8);
    expect(simulated.mean).toBeCloseTo(3, 1.5);
    expect(simulated.low).toBeGreaterThanOrEqual(2);
    expect(simulated.high).toBeLessThanOrEqual(4);
  });
  it('agrees with the budget where that holds: normal rows, correlated', () => {
    const lines = [normal('a', 0.0008), normal('b', 0.0011, -1), normal('c', 0.0005)];
    const correlations = [{ between: ['a', 'b'], coefficient: 0.6 }] as const;
    const budget = found(combineBudget(lines, correlations));
    const simulated = monteCarloBudget({ value: 9, lines, correlations, trials: 100_000, uniform: uniform() });
    if (simulated.kind !== 'found') throw new Error(simulated.kind);
    const agreement = budgetAgreement(9, budget, simulated);
    expect(agreement).toMatchObject({ agree: true, enoughTrials: true });
    expect(agreement.tolerance).toBeCloseTo(0.00005, 12);
    expect(simulated.shortest.high - simulated.shortest.low).toBeLessThanOrEqual(simulated.high - simulated.low);
  });
  it('says that it disagrees where one rectangular row rules, and that few trials cannot tell', () => {
    const lines = [{ ...normal('meter', 0.01), distribution: 'rectangular' as const, divisor: Math.sqrt(3) }];
    const budget = found(combineBudget(lines));
    const ask = (trials: number) => {
      const simulated = monteCarloBudget({ value: 9, lines, trials, uniform: uniform() });
      if (simulated.kind !== 'found') throw new Error(simulated.kind);
      return budgetAgreement(9, budget, simulated);
    };
    const many = ask(100_000);
    expect(many).toMatchObject({ agree: false, enoughTrials: true });
    // Further in than the budget: ±0.95 of the half width instead of 2/sqrt(3) of it.
    expect(many.highFurther).toBeCloseTo(0.01 * (0.9545 - 2.00002 / Math.sqrt(3)), 4);
    const sharp = [normal('a', 0.0092)];
    const few = monteCarloBudget({ value: 9, lines: sharp, trials: 1000, uniform: uniform() });
    if (few.kind !== 'found') throw new Error(few.kind);
    expect(budgetAgreement(9, found(combineBudget(sharp)), few).enoughTrials).toBe(false);
    expect(() => monteCarloBudget({ value: 9, lines: sharp, trials: 10, uniform: uniform() })).toThrow(RangeError);
  });
  it('repeats give a t distribution: 3 degrees of freedom reach further than 2 sigma', () => {
    const lines = [normal('repeats', 1, 1, 3)];
    const simulated = monteCarloBudget({ value: 0, lines, trials: 40_000, uniform: uniform(), coverage: 0.95 });
    if (simulated.kind !== 'found') throw new Error(simulated.kind);
    expect(Math.abs((simulated.high - simulated.low) / 2 - 3.182446)).toBeLessThan(0.1);
  });
});

describe('terms of the definition', () => {
  const approach = {
    noiseVolts: 0.001,
    looksPerSettle: 4,
    rampVoltsPerSecond: 0,
    boardSeconds: 0.002,
    senseSeconds: 0.005,
    overshoot: 0.07,
    decidingMoveVolts: 0.01,
  };
  it('one look a level needs no dwell term; four looks move the point by one sigma', () => {
    const dwell = (looksPerSettle: number) => definitionTerms({ ...approach, looksPerSettle })[0]!.tripVolts;
    expect(Math.abs(dwell(1))).toBeLessThan(1e-12);
    // The search study saw 0.94 mV at 1 mV of noise, its estimator not being the level of even chances alone.
    expect(Math.abs(dwell(4) - 0.00094)).toBeLessThan(0.0001);
  });
  it('sense lag and board lag act against each other, and only on a ramp', () => {
    const lag = (more: Partial<typeof approach>) =>
      definitionTerms({ ...approach, rampVoltsPerSecond: 1, ...more })[1]!.tripVolts;
    expect(lag({})).toBeCloseTo(0.003, 12);
    expect(lag({ boardSeconds: 0.005 })).toBeCloseTo(0, 12);
    expect(definitionTerms(approach)[1]!.tripVolts).toBe(0);
  });
  it('have opposite signs in trip and release and add in hysteresis', () => {
    const terms = definitionTerms({ ...approach, rampVoltsPerSecond: 1 });
    const [trip, release, hysteresis] = (['trip', 'release', 'hysteresis'] as const).map((quantity) =>
      definitionLines(quantity, terms),
    );
    trip!.forEach((line, i) => {
      expect(release![i]!.sensitivity).toBe(-line.sensitivity);
      expect(hysteresis![i]!.sensitivity).toBe(release![i]!.sensitivity - line.sensitivity);
    });
    const u = (lines: BudgetLine[]) => found(combineBudget(lines)).standard;
    expect(u(hysteresis!)).toBeCloseTo(2 * u(trip!), 12);
    expect(definitionLines('trip', definitionTerms(approach)).map(({ contributor }) => contributor)).toEqual([
      'dwell',
      'overshoot',
    ]);
  });
});
