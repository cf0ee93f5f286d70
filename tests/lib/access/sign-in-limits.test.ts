import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import {
  mostTriesEvaluated,
  nextTryAtMs,
  triesWindowMs,
  waitAfterFailuresMs,
  type EvaluatedTry,
} from '@/lib/access/sign-in-limits';

const failed = (atMs: number): EvaluatedTry => ({ atMs, succeeded: false });
const worked = (atMs: number): EvaluatedTry => ({ atMs, succeeded: true });

describe('nextTryAtMs', () => {
  test('lets the first try and the one after a single slip through at once', () => {
    expect(nextTryAtMs([], 1000)).toBe(1000);
    expect(nextTryAtMs([failed(999)], 1000)).toBe(1000);
  });

  test('waits longer after each further failure in a row', () => {
    expect([2, 3, 4, 5].map(waitAfterFailuresMs)).toEqual([2000, 4000, 8000, 16_000]);
    expect(nextTryAtMs([failed(0), failed(10), failed(20)], 30)).toBe(4020);
  });

  test('forgets the growing wait after a success, but not the count of ten', () => {
    const nine = Array.from({ length: 9 }, (_, i) => failed(i));
    expect(nextTryAtMs([...nine, worked(10)], 20)).toBe(20);
    expect(nextTryAtMs([...nine, worked(10), failed(15)], 20)).toBe(triesWindowMs);
  });

  test('forgets everything older than the window', () => {
    const ten = Array.from({ length: 10 }, (_, i) => failed(i));
    expect(nextTryAtMs(ten, 9 + triesWindowMs)).toBe(9 + triesWindowMs);
  });

  test('whoever tries as often as allowed has at most ten failures in any 15 minutes', () => {
    fc.assert(
      fc.property(fc.array(fc.integer({ min: 0, max: 60_000 }), { minLength: 30, maxLength: 60 }), (pauses) => {
        const tries: EvaluatedTry[] = [];
        let now = 0;
        for (const pause of pauses) {
          now = nextTryAtMs(tries, now + pause);
          tries.push(failed(now));
        }
        for (const { atMs } of tries) {
          const inWindow = tries.filter((t) => t.atMs > atMs - triesWindowMs && t.atMs <= atMs);
          if (inWindow.length > mostTriesEvaluated) return false;
        }
        return true;
      }),
    );
  });
});
