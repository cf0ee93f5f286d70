import { describe, expect, it } from 'vitest';
import type { BoardRecord } from '@/lib/decision/board-standing';
import { secondSignerProblem } from '@/lib/decision/concession-sides';
import { decidableKinds, dispositionProblem } from '@/lib/decision/disposition-problem';

type Run = BoardRecord['runs'][number];
const run = (id: string, verdict: Run['verdict'], failingWhenStopped = false): Run => ({
  id,
  verdict,
  failingWhenStopped,
  endedAt: '2026-12-01T08:00:00.000Z',
});
const record = (runs: Run[], over: Partial<BoardRecord> = {}): BoardRecord => ({
  scrapped: false,
  runs,
  dispositions: [],
  retestOrders: [],
  mostAttempts: 3,
  ...over,
});

describe('what can be decided about a board', () => {
  it.each([
    ['a reject: everything', record([run('a', 'reject')]), ['rework', 'scrap', 'concession', 'return']],
    [
      'a last reject: no rework',
      record(['a', 'b', 'c'].map((id) => run(id, 'reject'))),
      ['scrap', 'concession', 'return'],
    ],
    [
      'a failing run that was stopped: no concession',
      record([run('a', 'no-verdict', true)]),
      ['rework', 'scrap', 'return'],
    ],
    ['a pass: nothing', record([run('a', 'pass')]), []],
    ['a board in test: nothing', record([run('a', 'reject'), run('b', null)]), []],
    ['a board never tested: nothing', record([]), []],
    ['a scrapped board: nothing', record([run('a', 'reject')], { scrapped: true }), []],
  ])('%s', (_what, board, kinds) => {
    expect(decidableKinds(board)).toEqual(kinds);
  });

  it('answers the newest run and no other', () => {
    const board = record([run('a', 'no-verdict', true), run('b', 'reject')]);
    expect(dispositionProblem('scrap', board, 'a')).toBe('changed-meanwhile');
    expect(dispositionProblem('scrap', board, 'b')).toBeNull();
  });

  it('is no second concession while one waits, but anything else', () => {
    const waiting = { runId: 'a', kind: 'concession' as const, signedAt: '2026-12-01T09:00:00.000Z', complete: false };
    const board = record([run('a', 'reject')], { dispositions: [waiting] });
    expect(dispositionProblem('concession', board, 'a')).toBe('concession-waits');
    expect(decidableKinds(board)).toEqual(['rework', 'scrap', 'return']);
  });
});

describe('the two sides of a concession', () => {
  const first = { accountId: '1', sides: ['quality'] as const };
  it.each([
    ['an engineer', { accountId: '2', sides: ['engineering'] as const }, null],
    ['somebody of both sides', { accountId: '2', sides: ['quality', 'engineering'] as const }, null],
    ['somebody of the same side', { accountId: '2', sides: ['quality'] as const }, 'same-side'],
    ['somebody of neither', { accountId: '2', sides: [] as const }, 'same-side'],
    ['the same person', { accountId: '1', sides: ['engineering'] as const }, 'same-person'],
  ])('beside quality: %s', (_who, second, problem) => {
    expect(secondSignerProblem(first, second)).toBe(problem);
  });
});
