import { describe, expect, it } from 'vitest';
import { boardStanding, type BoardRecord } from '@/lib/decision/board-standing';

type Run = BoardRecord['runs'][number];
const run = (id: string, verdict: Run['verdict'], failingWhenStopped = false): Run => ({
  id,
  endedAt: verdict ? `2026-12-01T08:0${id}:00Z` : null,
  verdict,
  failingWhenStopped,
});
const decided = (runId: string, kind: BoardRecord['dispositions'][number]['kind'], complete = true) => ({
  runId,
  kind,
  signedAt: `2026-12-01T09:0${runId}:00Z`,
  complete,
});
const board = (over: Partial<BoardRecord>): BoardRecord => ({
  scrapped: false,
  runs: [],
  dispositions: [],
  retestOrders: [],
  mostAttempts: 3,
  ...over,
});
const standing = (over: Partial<BoardRecord>) => boardStanding(board(over));
const mayBeTested = { kind: 'may-be-tested', retestOrderId: null };

describe('a board may be tested', () => {
  it('before its first run', () => {
    expect(standing({})).toEqual(mayBeTested);
  });
  it('again after one or two runs without a verdict', () => {
    expect(standing({ runs: [run('1', 'no-verdict'), run('2', 'no-verdict')] })).toEqual(mayBeTested);
  });
  it('again after a reject and a recorded rework', () => {
    expect(standing({ runs: [run('1', 'reject')], dispositions: [decided('1', 'rework')] })).toEqual(mayBeTested);
  });
  it('after a pass only under a retest order, which is named', () => {
    const order = { id: 'o1', usedByRunId: null };
    expect(standing({ runs: [run('1', 'pass')], retestOrders: [order] })).toEqual({
      kind: 'may-be-tested',
      retestOrderId: 'o1',
    });
  });
  it('still under an order whose run broke off', () => {
    const runs = [run('1', 'pass'), run('2', 'no-verdict')];
    expect(standing({ runs, retestOrders: [{ id: 'o1', usedByRunId: '2' }] })).toMatchObject({ retestOrderId: 'o1' });
  });
  it('once quality ordered it for a board that waited', () => {
    const runs = [run('1', 'no-verdict', true)];
    expect(standing({ runs, retestOrders: [{ id: 'o1', usedByRunId: null }] })).toMatchObject({ retestOrderId: 'o1' });
  });
  it('once a rework was recorded for a board that waited', () => {
    expect(standing({ runs: [run('1', 'no-verdict', true)], dispositions: [decided('1', 'rework')] })).toEqual(
      mayBeTested,
    );
  });
});

describe('a board is refused', () => {
  it('while a run is open', () => {
    expect(standing({ runs: [run('1', null)] })).toEqual({ kind: 'in-test' });
  });
  it('after a pass, with the time', () => {
    expect(standing({ runs: [run('1', 'pass')] })).toEqual({ kind: 'passed', at: '2026-12-01T08:01:00Z' });
  });
  it('after a pass whose retest order was used up by a verdict', () => {
    const runs = [run('1', 'pass'), run('2', 'pass')];
    expect(standing({ runs, retestOrders: [{ id: 'o1', usedByRunId: '2' }] })).toMatchObject({ kind: 'passed' });
  });
  it('when a retest replaced the pass by a reject', () => {
    const runs = [run('1', 'pass'), run('2', 'reject')];
    expect(standing({ runs, retestOrders: [{ id: 'o1', usedByRunId: '2' }] })).toEqual({ kind: 'needs-disposition' });
  });
  it('after a reject until something is decided', () => {
    expect(standing({ runs: [run('1', 'reject')] })).toEqual({ kind: 'needs-disposition' });
  });
  it('when the rework on record answers an earlier reject', () => {
    const runs = [run('1', 'reject'), run('2', 'reject')];
    expect(standing({ runs, dispositions: [decided('1', 'rework')] })).toEqual({ kind: 'needs-disposition' });
  });
  it('while a concession lacks its second signature', () => {
    expect(standing({ runs: [run('1', 'reject')], dispositions: [decided('1', 'concession', false)] })).toEqual({
      kind: 'needs-disposition',
    });
  });
  it.each([
    ['scrap', 'scrapped'],
    ['return', 'returned'],
    ['concession', 'used-as-is'],
  ] as const)('after %s', (kind, expected) => {
    expect(standing({ runs: [run('1', 'reject')], dispositions: [decided('1', kind)] })).toEqual({ kind: expected });
  });
  it('when its attempts are used, whatever was reworked', () => {
    const runs = [run('1', 'reject'), run('2', 'reject'), run('3', 'reject')];
    expect(standing({ runs, dispositions: [decided('3', 'rework')] })).toEqual({ kind: 'attempts-used', most: 3 });
  });
  it('when stopping a failing run would hide a reject', () => {
    expect(standing({ runs: [run('1', 'no-verdict', true)] })).toEqual({
      kind: 'waits-for-quality',
      because: 'failing-when-stopped',
    });
  });
  it('after three runs without a verdict, which use up no attempt', () => {
    const runs = [run('1', 'no-verdict'), run('2', 'no-verdict'), run('3', 'no-verdict')];
    expect(standing({ runs })).toEqual({ kind: 'waits-for-quality', because: 'three-without-verdict' });
    expect(standing({ runs, mostAttempts: 1, dispositions: [decided('3', 'rework')] })).toEqual(mayBeTested);
  });
  it('when a run under a retest order was stopped while failing', () => {
    const runs = [run('1', 'pass'), run('2', 'no-verdict', true)];
    expect(standing({ runs, retestOrders: [{ id: 'o1', usedByRunId: '2' }] })).toMatchObject({
      kind: 'waits-for-quality',
    });
  });
});
