import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { judgeValue } from '@/lib/decision/judge-value';
import type { DecisionRule } from '@/lib/sequence/step';

const simple: DecisionRule = { kind: 'simple' };
const guarded = (factor: number): DecisionRule => ({ kind: 'guard-band', factor });
const limits = { min: 10.7, max: 10.9 };
const finite = fc.double({ min: -100, max: 100, noNaN: true });

describe('judging a value', () => {
  it('under simple acceptance passes on the limits and fails beyond them', () => {
    expect(judgeValue(10.7, limits, 0.01, simple)).toMatchObject({ passed: true, side: null });
    expect(judgeValue(10.9001, limits, 0.01, simple)).toMatchObject({ passed: false, side: 'high' });
  });
  it('draws limits in by factor times U', () => {
    const judged = judgeValue(10.703, limits, 0.004, guarded(1));
    expect(judged.guardedMin).toBeCloseTo(10.704, 9);
    expect(judged.guardedMax).toBeCloseTo(10.896, 9);
    expect(judged).toMatchObject({ passed: false, side: 'low' });
  });
  it('leaves limits as they are where no uncertainty is stated', () => {
    expect(judgeValue(10.9, limits, null, guarded(1)).passed).toBe(true);
  });
  it('passes nothing once the guard band is over half the tolerance', () => {
    expect(judgeValue(10.8, limits, 0.11, guarded(1)).passed).toBe(false);
    expect(judgeValue(10.79, limits, 0.11, guarded(1)).side).toBe('low');
    expect(judgeValue(10.81, limits, 0.11, guarded(1)).side).toBe('high');
  });
  it('never passes what is not a number', () => {
    expect(judgeValue(NaN, limits, 0.001, simple).passed).toBe(false);
  });
  it('with one limit judges that side only', () => {
    expect(judgeValue(-50, { min: null, max: 1 }, 0, simple).passed).toBe(true);
  });
  it('passes no value under a wider guard band that fails under a narrower one', () => {
    fc.assert(
      fc.property(
        finite,
        fc.double({ min: 0, max: 3, noNaN: true }),
        fc.double({ min: 0, max: 3, noNaN: true }),
        (value, a, b) => {
          const [narrow, wide] = [Math.min(a, b), Math.max(a, b)];
          const passedWide = judgeValue(value, limits, 0.05, guarded(wide)).passed;
          return !passedWide || judgeValue(value, limits, 0.05, guarded(narrow)).passed;
        },
      ),
    );
  });
  it('is unchanged when value and limits shift together', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1000, max: 1000 }), fc.integer({ min: -50, max: 50 }), (value, shift) => {
        const range = { min: -100, max: 100 };
        const moved = { min: -100 + shift, max: 100 + shift };
        return (
          judgeValue(value, range, 3, guarded(1)).passed === judgeValue(value + shift, moved, 3, guarded(1)).passed
        );
      }),
    );
  });
});
