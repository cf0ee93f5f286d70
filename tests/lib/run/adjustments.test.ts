import { describe, expect, it } from 'vitest';
import { noteAdjustment } from '@/lib/run/adjustments';
import type { Adjustment } from '@/lib/run/types';
import type { TrimView } from '@/lib/trim/types';
import { planFor, playBoard } from './play-board';

describe.each(['CB1210', 'CB0612'])('the adjustments of a %s', (code) => {
  const { result } = playBoard(planFor(code), { seed: 11 });

  it('are kept with the result, in order and never past four turns', () => {
    const { adjustments } = result;
    expect(adjustments.length).toBeGreaterThan(0);
    expect(Math.max(...adjustments.map(({ round }) => round))).toBe(result.trimRounds);
    for (const { turns, atMs } of adjustments) {
      expect(turns).toBeGreaterThan(0);
      expect(turns).toBeLessThanOrEqual(4);
      expect(atMs).toBeGreaterThan(0);
    }
    const times = adjustments.map(({ atMs }) => atMs);
    expect(times).toEqual([...times].sort((a, b) => a - b));
  });
});

it('of a board that was rejected before its trim are none', () => {
  const { result } = playBoard(planFor('CB1210'), { seed: 3, defect: 'op-amp-missing' });
  expect(result).toMatchObject({ verdict: 'reject', adjustments: [] });
});

describe('what the screen asks', () => {
  const view: TrimView = {
    stage: 'turn',
    direction: 'clockwise',
    turns: 1.7,
    words: { unit: 'turns', whole: 1, eighths: 6 },
    targetVolts: 10.8,
    toleranceVolts: 0.02,
    heldVolts: null,
    lastTripVolts: 10.34,
    lastTripIsStale: false,
    liveTripVolts: null,
    finding: null,
    findingVolts: null,
    round: 1,
    paceTurnsPerSecond: null,
  };
  const note = (...views: TrimView[]) =>
    views.reduce<readonly Adjustment[]>((before, each, i) => noteAdjustment(before, each, i * 100), []);

  it('is one adjustment while the dial counts down', () => {
    expect(note(view, { ...view, turns: 1.1, lastTripIsStale: true }, { ...view, turns: 0.4 })).toEqual([
      {
        atMs: 0,
        round: 1,
        direction: 'clockwise',
        turns: 1.7,
        words: { unit: 'turns', whole: 1, eighths: 6 },
        fromVolts: 10.34,
        until: 'turned',
      },
    ]);
  });
  it('is another one in the next round, the other way, or until the second beep', () => {
    const asked = note(
      view,
      { ...view, round: 2 },
      { ...view, round: 2, direction: 'anticlockwise' },
      { ...view, round: 2, stage: 'beep-2' },
    );
    expect(asked).toHaveLength(4);
  });
  it('is nothing while it measures', () => {
    expect(note({ ...view, stage: 'measuring', direction: null, turns: null })).toEqual([]);
  });
});
