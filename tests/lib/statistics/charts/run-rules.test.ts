import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { runRules, runSignals, type RunRule } from '@/lib/statistics/charts/run-rules';

const series = fc.array(fc.double({ min: -4, max: 4, noNaN: true }), { maxLength: 60 });

/** The rules word for word, on the window that ends at `i`; slow and plain. */
const words: Record<RunRule, (z: number[], i: number) => boolean> = {
  1: (z, i) => Math.abs(z[i]!) > 3,
  2: (z, i) => last(z, i, 9, (w) => w.every((v) => v > 0) || w.every((v) => v < 0)),
  3: (z, i) => last(z, i, 6, (w) => steps(w).every((d) => d > 0) || steps(w).every((d) => d < 0)),
  4: (z, i) =>
    last(z, i, 14, (w) => {
      const d = steps(w);
      return d.every((v) => v !== 0) && d.every((v, k) => k === 0 || Math.sign(v) === -Math.sign(d[k - 1]!));
    }),
  5: (z, i) => zone(z, i, 2, 3, 2),
  6: (z, i) => zone(z, i, 4, 5, 1),
  7: (z, i) => last(z, i, 15, (w) => w.every((v) => Math.abs(v) < 1)),
  8: (z, i) => last(z, i, 8, (w) => w.every((v) => Math.abs(v) > 1) && w.some((v) => v > 0) && w.some((v) => v < 0)),
};
const last = (z: number[], i: number, n: number, holds: (window: number[]) => boolean) =>
  i + 1 >= n && holds(z.slice(i + 1 - n, i + 1));
const steps = (w: number[]) => w.slice(1).map((v, k) => v - w[k]!);
const zone = (z: number[], i: number, wanted: number, n: number, beyond: number) =>
  [1, -1].some(
    (side) =>
      z[i]! * side > beyond && z.slice(Math.max(0, i + 1 - n), i + 1).filter((v) => v * side > beyond).length >= wanted,
  );

describe('run rules', () => {
  it.each(runRules.map((rule) => [rule]))('rule %i signals exactly where its wording holds', (rule) => {
    const coarse = fc.array(fc.constantFrom(-3.2, -2.1, -1.5, -0.5, 0, 0.4, 0.8, 1.2, 2.3, 3.1), { maxLength: 80 });
    const drifting = fc.array(fc.double({ min: -1, max: 1.2, noNaN: true }), { maxLength: 80 });
    const zigzag = series.map((z) => z.map((v, i) => (i % 2 ? Math.abs(v) : -Math.abs(v)) * 0.8));
    const rising = series.map((z) => z.map((v, i) => v / 20 + ((i % 17) - 8) / 3));
    fc.assert(
      fc.property(fc.oneof(series, coarse, drifting, zigzag, rising), (z) => {
        const expected = z.flatMap((_, i) => (words[rule](z, i) ? [i] : []));
        expect(runSignals(z, [rule]).map(({ at }) => at)).toEqual(expected);
      }),
      { numRuns: 300 },
    );
  });
  it('says where the run began', () => {
    const nine = [-0.5, ...Array<number>(11).fill(0.7)];
    expect(runSignals(nine, [2]).map(({ from, at }) => [from, at])).toEqual([
      [1, 9],
      [1, 10],
      [1, 11],
    ]);
    expect(runSignals([0, 2.5, 0, 2.5], [5])).toEqual([{ rule: 5, from: 1, at: 3 }]);
    expect(runSignals([3.5], [1])).toEqual([{ rule: 1, from: 0, at: 0 }]);
    expect(runSignals([5, 0, 1, 2, 3, 4, 5], [3])).toEqual([{ rule: 3, from: 1, at: 6 }]);
    const alternating = Array.from({ length: 15 }, (_, i) => (i === 0 ? -0.9 : i % 2 ? 0.5 : -0.5));
    expect(runSignals([0.1, ...alternating], [4]).map(({ from }) => from)).toEqual([0, 0, 0]);
  });
  it('sees the same above and below the centre', () => {
    fc.assert(
      fc.property(series, (z) => {
        expect(runSignals(z.map((v) => -v))).toEqual(runSignals(z));
      }),
    );
  });
  it('never takes back a signal when boards are added, and a run is never longer than its beginning allows', () => {
    fc.assert(
      fc.property(series, series, (z, more) => {
        const before = runSignals(z);
        expect(runSignals([...z, ...more]).filter(({ at }) => at < z.length)).toEqual(before);
        for (const { from, at } of before) expect(from >= 0 && from <= at).toBe(true);
      }),
    );
  });
  it('rules that are switched off signal nothing', () => {
    fc.assert(
      fc.property(series, fc.subarray([...runRules]), (z, chosen) => {
        expect(runSignals(z, chosen)).toEqual(runSignals(z).filter(({ rule }) => chosen.includes(rule)));
      }),
    );
  });
});
