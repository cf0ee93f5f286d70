import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countBroken, runStretches } from '@/lib/quality/run-stretches';
import { stretchList, stretchWords } from '@/lib/quality/run-words';
import { runSignals, type RunRule } from '@/lib/statistics/charts/run-rules';

const places = (z: readonly number[]) => z.map((_, i) => i);
const stretchesOf = (z: readonly number[], rules: RunRule[]) => runStretches(runSignals(z, rules), z, places(z));

describe('stretches of run-rule signals', () => {
  it('tell a run of fourteen once, from its first board to its last', () => {
    const z = [-0.1, ...Array<number>(14).fill(0.5), -0.2];
    expect(stretchesOf(z, [2])).toEqual([{ rule: 2, from: 2, to: 15, boards: 14, side: 'above', direction: null }]);
    expect(stretchWords(stretchesOf(z, [2])[0]!)).toBe('Boards 2 to 15: 14 in a row above centre');
  });

  it('keep runs on either side apart, and single boards beyond a limit single', () => {
    const z = [...Array<number>(9).fill(0.5), ...Array<number>(9).fill(-0.5), 3.5, 3.2, -3.1];
    expect(stretchesOf(z, [1, 2]).map(({ rule, from, to, side }) => [rule, from, to, side])).toEqual([
      [2, 1, 9, 'above'],
      [2, 10, 18, 'below'],
      [1, 19, 19, 'above'],
      [1, 20, 20, 'above'],
      [1, 21, 21, 'below'],
    ]);
  });

  it('number boards by test order, with those that were not measured', () => {
    const z = Array<number>(9).fill(0.5);
    const [run] = runStretches(runSignals(z, [2]), z, [0, 1, 2, 3, 5, 6, 7, 8, 11]);
    expect(run).toMatchObject({ from: 1, to: 12, boards: 9 });
  });

  it('say which way six boards run', () => {
    expect(stretchesOf([0, 0.1, 0.2, 0.3, 0.4, 0.5], [3])).toMatchObject([{ direction: 'rising' }]);
    expect(stretchWords(stretchesOf([0.5, 0.4, 0.3, 0.2, 0.1, 0], [3])[0]!)).toBe('Boards 1 to 6: 6 in a row falling');
  });

  it('cover every point at which a rule is broken, whatever the values', () => {
    fc.assert(
      fc.property(fc.array(fc.double({ min: -4, max: 4, noNaN: true }), { maxLength: 80 }), (z) => {
        const signals = runSignals(z);
        const stretches = runStretches(signals, z, places(z));
        for (const { rule, at } of signals)
          expect(stretches.some((each) => each.rule === rule && each.from <= at + 1 && each.to >= at + 1)).toBe(true);
        const counts = countBroken(signals);
        expect(Object.values(counts).reduce((a, b) => a + b, 0)).toBe(signals.length);
      }),
    );
  });

  it('list boards beyond one limit in a single line', () => {
    const z = [3.1, 0, 3.4, 0, 3.2];
    expect(stretchList(stretchesOf(z, [1]))).toEqual([
      { rule: 1, words: 'Boards 1, 3 and 5: beyond the upper control limit' },
    ]);
  });
});
