import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest';
import { Leadership, type BenchScreen } from '@/server/live/leadership';

let nowMs = 0;
let lost = 0;
let leadership: Leadership;
const roles = new Map<string, boolean>();

beforeEach(() => {
  vi.useFakeTimers();
  nowMs = 0;
  lost = 0;
  roles.clear();
  leadership = new Leadership(
    () => lost++,
    () => nowMs,
  );
});
afterEach(() => vi.useRealTimers());

function pass(ms: number): void {
  nowMs += ms;
  vi.advanceTimersByTime(ms);
}

/** Heard for the last time `silentMs` ago. */
function screen(id: string, silentMs = 0): BenchScreen {
  const joinedMs = nowMs;
  return { id, joinedMs, lastHeardMs: () => nowMs - silentMs, tell: ({ leads }) => void roles.set(id, leads) };
}

describe('Leadership', () => {
  test('the first screen leads, the second watches', () => {
    leadership.join(screen('first'));
    leadership.join(screen('second'));
    expect([...roles]).toEqual([
      ['first', true],
      ['second', false],
    ]);
    expect(leadership.leads('second')).toBe(false);
  });

  test('a screen that is reloaded within five seconds leads again, and nothing is lost', () => {
    leadership.join(screen('first'));
    leadership.leave('first');
    pass(4_900);
    leadership.join(screen('reloaded'));
    pass(10_000);
    expect(roles.get('reloaded')).toBe(true);
    expect(lost).toBe(0);
  });

  test('a reload that arrives before the old screen is known to be gone leads too', () => {
    leadership.join(screen('watcher'));
    pass(60_000);
    leadership.leave('watcher');
    pass(6_000);
    leadership.join(screen('first'));
    leadership.join(screen('second'));
    pass(60_000);
    leadership.join(screen('reloaded'));
    leadership.leave('first');
    expect(roles.get('reloaded')).toBe(true);
    expect(roles.get('second')).toBe(false);
  });

  test('after five seconds without it the bench is lost, once, and the next screen leads', () => {
    leadership.join(screen('first'));
    leadership.join(screen('second'));
    pass(60_000);
    leadership.leave('first');
    pass(4_999);
    expect(lost).toBe(0);
    expect(roles.get('second')).toBe(false);
    pass(1);
    expect(lost).toBe(1);
    expect(roles.get('second')).toBe(true);
    pass(60_000);
    expect(lost).toBe(1);
  });

  test('the five seconds count from when the screen was last heard', () => {
    leadership.join(screen('first', 3_000));
    leadership.leave('first');
    pass(1_999);
    expect(lost).toBe(0);
    pass(1);
    expect(lost).toBe(1);
  });

  test('a watcher that leaves changes nothing', () => {
    leadership.join(screen('first'));
    leadership.join(screen('second'));
    leadership.leave('second');
    pass(60_000);
    expect(lost).toBe(0);
    expect(leadership.leads('first')).toBe(true);
  });
});
