import { describe, expect, it } from 'vitest';
import { falseHolds } from '@/lib/statistics/charts/false-holds';
import { firstHold, usualHoldRules } from '@/lib/statistics/charts/hold-rules';
import { runRules } from '@/lib/statistics/charts/run-rules';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

const quiet = (n: number) => Array.from({ length: n }, (_, i) => (i % 2 ? 0.3 : -0.3));

describe('hold', () => {
  it('one board beyond three sigma does not stop a lot, a second within ten does', () => {
    const z = [...quiet(5), 3.4, ...quiet(8), 3.2, ...quiet(3)];
    expect(firstHold([...quiet(5), 3.4, ...quiet(20)])).toBeNull();
    expect(firstHold(z)).toEqual({ holdRule: usualHoldRules[0], from: 5, at: 14 });
  });
  it('two boards ten apart do not: the window is of ten', () => {
    expect(firstHold([...quiet(5), 3.4, ...quiet(9), -3.2, ...quiet(3)])).toBeNull();
    expect(firstHold([...quiet(5), 3.4, ...quiet(8), -3.2, ...quiet(3)])).not.toBeNull();
  });
  it('nine on one side do at once, and the earliest cause is named', () => {
    const z = [...quiet(4), ...Array<number>(9).fill(0.8), 3.5, 3.5];
    expect(firstHold(z)).toEqual({ holdRule: usualHoldRules[1], from: 3, at: 11 });
  });
});

describe('false holds of a stable lot', () => {
  const ask = (holdRules: Parameters<typeof falseHolds>[0]['holdRules'], baselineBoards: number | null, lots: number) =>
    falseHolds({ boardsPerLot: 240, holdRules, baselineBoards, lots, uniform: wichmannHill(11) });

  it('one point beyond three sigma: 1 - (1 - 0.0027)^240 of the lots', () => {
    const { lotsHeld, holdsPerLot, standardError } = ask([{ rule: 1, times: 1, within: 1 }], null, 2000);
    const exact = 1 - (1 - 0.002699796063) ** 240;
    expect(Math.abs(lotsHeld.share - exact)).toBeLessThan(0.035);
    expect(Math.abs(holdsPerLot - 240 * 0.002699796063)).toBeLessThan(4 * standardError);
  });
  it('nine on one side: the recursion over the length of the run', () => {
    const length = new Array<number>(8).fill(0);
    length[0] = 1;
    let held = 0;
    for (let board = 1; board < 240; board++) {
      held += length[7]! / 2;
      const broken = length.reduce((sum, p) => sum + p / 2, 0);
      for (let k = 7; k > 0; k--) length[k] = length[k - 1]! / 2;
      length[0] = broken;
    }
    const { lotsHeld } = ask([{ rule: 2, times: 1, within: 1 }], null, 2000);
    expect(Math.abs(lotsHeld.share - held)).toBeLessThan(0.04);
  });
  it('all eight rules would stop some 97 of 100 stable lots, the usual ones far fewer', () => {
    const all = ask(
      runRules.map((rule) => ({ rule, times: 1, within: 1 })),
      null,
      400,
    );
    expect(all.lotsHeld.share).toBeGreaterThan(0.94);
    expect(all.lotsHeld.share).toBeLessThan(0.99);
    const usual = ask(usualHoldRules, null, 400);
    expect(usual.lotsHeld.share).toBeLessThan(0.45);
  });
  it('limits from thirty boards cost more than limits known exactly', () => {
    const rules = [{ rule: 1, times: 1, within: 1 }] as const;
    expect(ask(rules, 30, 600).holdsPerLot).toBeGreaterThan(ask(rules, null, 600).holdsPerLot);
  });
  it('same numbers, same answer', () => {
    expect(ask(usualHoldRules, 30, 50)).toEqual(ask(usualHoldRules, 30, 50));
  });
});
