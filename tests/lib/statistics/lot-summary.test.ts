import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { summariseLot, type LotBoard } from '@/lib/statistics/lot-summary';

type Ending = 'P' | 'R' | 'N' | 'F' | 'open';

/** A board from its runs: P pass, R reject, N no verdict, F stopped while failing. */
function board(endings: Ending[], over: Partial<LotBoard> = {}): LotBoard {
  return {
    serial: 'x',
    scrapped: false,
    mostAttempts: 3,
    dispositions: [],
    retestOrders: [],
    runs: endings.map((ending, i) => ({
      id: String(i),
      endedAt: ending === 'open' ? null : `2026-12-01T08:0${i}:00Z`,
      verdict: { P: 'pass', R: 'reject', N: 'no-verdict', F: 'no-verdict', open: null }[
        ending
      ] as LotBoard['runs'][0]['verdict'],
      failingWhenStopped: ending === 'F',
      rejectReason: ending === 'R' ? 'release-too-high' : null,
    })),
    ...over,
  };
}
const reworked = (runId: string) => ({
  runId,
  kind: 'rework' as const,
  signedAt: '2026-12-01T09:00:00Z',
  complete: true,
});

describe('yields', () => {
  it('count the first verdict and the last, and leave boards without one out', () => {
    const lot = [
      board(['P']),
      board(['P']),
      board(['R', 'P'], { dispositions: [reworked('0')] }),
      board(['R']),
      board(['N', 'P']),
      board(['N']),
      board([]),
    ];
    const summary = summariseLot(lot);
    expect(summary).toMatchObject({
      size: 7,
      tested: 5,
      passedFirst: 3,
      passedLater: 1,
      rejected: 1,
      runsWithoutVerdict: 2,
    });
    expect(summary.firstPassYield).toBeCloseTo(3 / 5);
    expect(summary.finalYield).toBeCloseTo(4 / 5);
    expect(summary.marks).toBe('PPWRPN.');
  });

  it('are null before the first verdict', () => {
    expect(summariseLot([board([]), board(['N'])])).toMatchObject({
      tested: 0,
      firstPassYield: null,
      finalYield: null,
    });
  });

  it('count a pass that a retest took back against the final yield only', () => {
    expect(summariseLot([board(['P', 'R'])])).toMatchObject({
      firstPassYield: 1,
      finalYield: 0,
      rejected: 1,
      passedLater: 0,
    });
  });

  it('do not change when runs without a verdict are added anywhere', () => {
    const endings = fc.array(fc.constantFrom<Ending>('P', 'R', 'N'), { maxLength: 5 });
    fc.assert(
      fc.property(fc.array(endings, { maxLength: 8 }), (lot) => {
        const whole = summariseLot(lot.map((runs) => board(runs)));
        const without = summariseLot(lot.map((runs) => board(runs.filter((ending) => ending !== 'N'))));
        expect(whole.firstPassYield).toBe(without.firstPassYield);
        expect(whole.finalYield).toBe(without.finalYield);
      }),
    );
  });

  it('agree with the counts: passed and rejected make up the tested', () => {
    const endings = fc.array(fc.constantFrom<Ending>('P', 'R', 'N', 'F'), { maxLength: 5 });
    fc.assert(
      fc.property(fc.array(endings, { maxLength: 12 }), (lot) => {
        const summary = summariseLot(lot.map((runs) => board(runs)));
        expect(Math.round((summary.finalYield ?? 0) * summary.tested)).toBe(summary.tested - summary.rejected);
        expect(summary.marks).toHaveLength(summary.size);
        expect(summary.reasons.reduce((sum, reason) => sum + reason.boards, 0)).toBe(summary.rejected);
      }),
    );
  });
});

describe('boards that wait for a decision', () => {
  it('are rejects without a disposition and boards stopped while failing', () => {
    const lot = [board(['R']), board(['F']), board(['R'], { dispositions: [reworked('0')] }), board(['P'])];
    expect(summariseLot(lot).undecided).toBe(2);
  });

  it('are told apart by reason and decision', () => {
    const scrap = { runId: '0', kind: 'scrap' as const, signedAt: '2026-12-01T09:00:00Z', complete: true };
    const lot = [
      board(['R']),
      board(['R'], { dispositions: [reworked('0')] }),
      board(['R'], { dispositions: [scrap] }),
    ];
    expect(summariseLot(lot).reasons).toEqual([
      { reason: 'release-too-high', boards: 3, decisions: { undecided: 1, rework: 1, scrap: 1, other: 0 } },
    ]);
  });
});
