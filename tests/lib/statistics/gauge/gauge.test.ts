import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { oneWayAnova } from '@/lib/statistics/anova/one-way';
import { straightLine } from '@/lib/statistics/anova/straight-line';
import { biasOf } from '@/lib/statistics/gauge/bias';
import { gaugeStudy } from '@/lib/statistics/gauge/gauge-study';
import { linearityOf } from '@/lib/statistics/gauge/linearity';
import { nestedAnova } from '@/lib/statistics/gauge/nested-anova';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';
import { drawNormal } from '@/lib/uncertainty/draw';

interface Truth {
  board: number;
  operator: number;
  interaction: number;
  repeat: number;
}

function simulate(truth: Truth, uniform: () => number, boards = 10, operators = 3, trials = 3) {
  const draw = (sd: number) => sd * drawNormal(uniform);
  const ofOperator = Array.from({ length: operators }, () => draw(truth.operator));
  return Array.from({ length: boards }, (_, b) => {
    const ofBoard = 10.8 + draw(truth.board);
    return ofOperator.flatMap((offset, o) => {
      const ofCell = ofBoard + offset + draw(truth.interaction);
      return Array.from({ length: trials }, () => ({
        board: `B${b}`,
        operator: `O${o}`,
        value: ofCell + draw(truth.repeat),
      }));
    });
  }).flat();
}

const truth = { board: 0.04, operator: 0.004, interaction: 0.003, repeat: 0.005 };

describe('crossed gauge study', () => {
  it('does not change with a shift, scales with the unit, nor with the order of boards', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: -20, max: 20 }), (seed, shift) => {
        const readings = simulate(truth, wichmannHill(seed), 4, 2, 2);
        const plain = gaugeStudy(readings, 0.2);
        const moved = gaugeStudy(readings.map((r) => ({ ...r, value: 1000 * r.value + shift })).reverse(), 200);
        if (plain.kind !== 'found' || moved.kind !== 'found') throw new Error(plain.kind);
        for (const way of ['withInteraction', 'withoutInteraction'] as const) {
          for (const name of ['repeatability', 'operator', 'interaction', 'board', 'gauge', 'total'] as const) {
            const variance = plain[way].components[name].variance;
            expect(moved[way].components[name].variance).toBeCloseTo(1e6 * variance, 4);
          }
          expect(moved[way].distinctCategories).toBe(plain[way].distinctCategories);
          expect(moved[way].figures.gauge.shareOfTolerance!).toBeCloseTo(plain[way].figures.gauge.shareOfTolerance!, 6);
        }
        expect(moved.averageRange.gauge).toBeCloseTo(1000 * plain.averageRange.gauge, 6);
      }),
      { numRuns: 30 },
    );
  });
  it('its intervals hold the truth in some 95 of 100 studies, and its estimates are right on the mean', () => {
    const uniform = wichmannHill(31);
    const gauge = truth.operator ** 2 + truth.interaction ** 2 + truth.repeat ** 2;
    const truths = { repeatability: truth.repeat ** 2, board: truth.board ** 2, operator: truth.operator ** 2, gauge };
    const held = { repeatability: 0, board: 0, operator: 0, gauge: 0 };
    let sum = 0;
    const studies = 400;
    for (let i = 0; i < studies; i++) {
      const found = gaugeStudy(simulate(truth, uniform), 0.2);
      if (found.kind !== 'found') throw new Error(found.kind);
      const { components } = found.withInteraction;
      sum += components.gauge.variance;
      for (const name of ['repeatability', 'board', 'operator', 'gauge'] as const) {
        const { low, high } = components[name].interval!;
        if (low <= truths[name] && truths[name] <= high) held[name]++;
      }
    }
    for (const count of Object.values(held)) {
      expect(count / studies).toBeGreaterThan(0.92);
      expect(count / studies).toBeLessThan(0.985);
    }
    expect(Math.abs(sum / studies / gauge - 1)).toBeLessThan(0.15);
  });
  it('refuses readings that are not a full cross, and says which are missing', () => {
    const readings = simulate(truth, wichmannHill(1), 3, 2, 2);
    expect(gaugeStudy(readings.slice(1), 0.2)).toEqual({
      kind: 'unbalanced',
      board: 'B0',
      operator: 'O0',
      readings: 1,
      wanted: 2,
    });
    expect(
      gaugeStudy(
        readings.filter((r) => r.operator === 'O0'),
        0.2,
      ),
    ).toEqual({ kind: 'tooFew' });
    expect(gaugeStudy([], 0.2)).toEqual({ kind: 'tooFew' });
    expect(
      gaugeStudy(
        readings.map((r) => ({ ...r, value: r.board === 'B0' ? 1 : 2 })),
        0.2,
      ),
    ).toEqual({ kind: 'noSpread' });
  });
  it('quotes the interaction where it is significant, and has no share of a one-sided tolerance', () => {
    const found = gaugeStudy(simulate({ ...truth, interaction: 0.05 }, wichmannHill(2)), null);
    if (found.kind !== 'found') throw new Error(found.kind);
    expect(found.quoted).toBe('withInteraction');
    expect(found.withInteraction.figures.gauge.shareOfTolerance).toBeNull();
  });
});

describe('nested study', () => {
  it('finds its components on the mean and refuses what it cannot part', () => {
    const uniform = wichmannHill(17);
    const draw = (sd: number) => sd * drawNormal(uniform);
    const sums = { operator: 0, board: 0, repeatability: 0 };
    for (let i = 0; i < 300; i++) {
      const values = Array.from({ length: 6 }, () => {
        const offset = draw(0.01);
        return Array.from({ length: 5 }, () => {
          const board = offset + draw(0.02);
          return Array.from({ length: 3 }, () => board + draw(0.005));
        });
      });
      const found = nestedAnova(values);
      if (found.kind !== 'found') throw new Error(found.kind);
      for (const name of ['operator', 'board', 'repeatability'] as const) sums[name] += found.components[name].variance;
    }
    expect(Math.abs(sums.board / 300 / 0.02 ** 2 - 1)).toBeLessThan(0.06);
    expect(Math.abs(sums.repeatability / 300 / 0.005 ** 2 - 1)).toBeLessThan(0.03);
    // Setting negative estimates to 0 lifts their mean.
    expect(Math.abs(sums.operator / 300 / 0.01 ** 2 - 1)).toBeLessThan(0.4);
    expect(
      nestedAnova([
        [
          [1, 2],
          [3, 4],
        ],
      ]),
    ).toEqual({ kind: 'tooFew' });
    expect(
      nestedAnova([
        [
          [1, 2],
          [3, 4],
        ],
        [[1, 2], [3]],
      ]),
    ).toEqual({ kind: 'unbalanced' });
    expect(
      nestedAnova([
        [
          [1, 1],
          [3, 3],
        ],
        [
          [1, 1],
          [3, 3],
        ],
      ]),
    ).toEqual({ kind: 'noSpread' });
  });
});

describe('bias and linearity', () => {
  it('a doubtful reference value widens the bias until it is not significant', () => {
    const readings = [10.004, 10.005, 10.006, 10.005, 10.004];
    expect(biasOf(readings, 10)).toMatchObject({ kind: 'found', significant: true });
    expect(biasOf(readings, 10, { referenceStandard: 0.01 })).toMatchObject({ kind: 'found', significant: false });
    expect(biasOf([1], 1)).toEqual({ kind: 'tooFew' });
    expect(biasOf([1, 1, 1], 1)).toEqual({ kind: 'noSpread' });
  });
  it('names the reference values where the gauge reads wrong', () => {
    const uniform = wichmannHill(3);
    const boards = [8, 9, 10, 11].map((reference) => ({
      reference,
      readings: Array.from({ length: 10 }, () => reference + 0.01 * (reference - 8) + 0.002 * drawNormal(uniform)),
    }));
    const { line, biasedAt, biases } = linearityOf(boards);
    if (line.kind !== 'found') throw new Error(line.kind);
    expect(line.slope.estimate).toBeCloseTo(0.01, 2);
    expect(line.slope.p).toBeLessThan(1e-6);
    expect(biasedAt).toEqual([9, 10, 11]);
    expect(biases.map((b) => b.kind === 'found' && b.significant)).toEqual([false, true, true, true]);
  });
  it('refuses a line through one level, two points, or points exactly on it', () => {
    expect(
      straightLine([
        { x: 1, y: 1 },
        { x: 2, y: 2 },
      ]),
    ).toEqual({ kind: 'tooFew' });
    expect(straightLine([1, 2, 3].map((y) => ({ x: 5, y })))).toEqual({ kind: 'oneLevel' });
    expect(straightLine([1, 2, 3].map((y) => ({ x: y, y: 2 * y })))).toEqual({ kind: 'noSpread' });
  });
});

describe('one-way analysis of variance', () => {
  const groups = fc.array(fc.array(fc.integer({ min: 0, max: 999 }), { maxLength: 12 }), { maxLength: 6 });
  it('does not change with shift, unit or order of the groups', () => {
    fc.assert(
      fc.property(groups, fc.integer({ min: -1e9, max: 1e9 }), (values, shift) => {
        const plain = oneWayAnova(values);
        const moved = oneWayAnova(values.map((group) => group.map((v) => 4 * v + shift)).reverse());
        expect(moved.kind).toBe(plain.kind);
        if (plain.kind !== 'found' || moved.kind !== 'found') return;
        expect(Math.abs(moved.f - plain.f)).toBeLessThan(1e-9 * (1 + plain.f));
        expect(moved.p).toBeCloseTo(plain.p, 9);
      }),
    );
  });
  it('refuses one group, and groups without any spread', () => {
    expect(oneWayAnova([[1, 2, 3]])).toEqual({ kind: 'tooFew' });
    expect(oneWayAnova([[1], [2]])).toEqual({ kind: 'tooFew' });
    expect(
      oneWayAnova([
        [1, 1],
        [2, 2],
      ]),
    ).toEqual({ kind: 'noSpread' });
  });
});
