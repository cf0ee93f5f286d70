import type { TrimView } from '../trim/types';
import type { Adjustment } from './types';

const until = { 'beep-1': 'first-beep', 'beep-2': 'second-beep', turn: 'turned' } as const;

/**
 * The turns that were asked for so far, with what the screen asks now. A dial that counts down while the screw turns, or
 * corrects itself the same way, is one adjustment: its first advice.
 */
export function noteAdjustment(before: readonly Adjustment[], view: TrimView, atMs: number): readonly Adjustment[] {
  const { stage, direction, turns, words, round } = view;
  if (direction === null || turns === null || !(stage in until)) return before;
  const asked: Adjustment = {
    atMs,
    round,
    direction,
    turns,
    words,
    fromVolts: view.lastTripIsStale ? null : view.lastTripVolts,
    until: until[stage as keyof typeof until],
  };
  const last = before.at(-1);
  const same = last && last.round === round && last.direction === direction && last.until === asked.until;
  return same ? before : [...before, asked];
}
