import { describe, expect, it } from 'vitest';
import type { DryBoardOutcome } from '@/lib/dry-run/outcome';
import { summarisePair, summariseSide } from '@/lib/dry-run/summarise';

const board = (over: Partial<DryBoardOutcome> = {}): DryBoardOutcome => ({
  verdict: 'pass',
  reason: null,
  stepId: null,
  tripVolts: 10.8,
  releaseVolts: 12.3,
  seconds: 40,
  personSeconds: 15,
  good: true,
  ...over,
});
const reject = (over: Partial<DryBoardOutcome> = {}) =>
  board({ verdict: 'reject', reason: 'trip-too-low', stepId: 's7', good: false, ...over });
const noVerdict = board({ verdict: 'no-verdict', stepId: 's1', tripVolts: null, releaseVolts: null });

describe('what a sequence did with its boards', () => {
  it('runs without a verdict are in no yield but are lost at their step', () => {
    const side = summariseSide([board(), reject(), noVerdict]);
    expect(side.firstPass).toMatchObject({ count: 1, of: 2 });
    expect(side.noVerdict).toBe(1);
    expect(side.lostAt).toEqual({ s7: 1, s1: 1 });
  });
  it('counts good boards rejected among the good, bad boards passed among the bad', () => {
    const side = summariseSide([board(), board({ good: false }), reject(), reject({ good: true })]);
    expect(side.falseRejects).toMatchObject({ count: 1, of: 2 });
    expect(side.falseAccepts).toMatchObject({ count: 1, of: 2 });
  });
  it('gives the time of passed boards alone, with the person and without', () => {
    const side = summariseSide([board(), board({ seconds: 50, personSeconds: 21 }), reject({ seconds: 3 })]);
    expect(side.boardSeconds).toBe(45);
    expect(side.stationSeconds).toBe(27);
  });
  it('every verified value is in one bin, which begins at or below it', () => {
    const values = [10.7951, 10.8, 10.8049, 10.8051];
    const { from, width, counts } = summariseSide(values.map((tripVolts) => board({ tripVolts }))).trip;
    expect(counts.reduce((sum, each) => sum + each, 0)).toBe(4);
    expect(counts).toEqual([1, 2, 1]);
    expect(from).toBeCloseTo(10.795, 9);
    expect(width).toBe(0.005);
  });
  it('settles in the order of the boards, as far as all before are done', () => {
    const outcomes = Array.from({ length: 100 }, (_, i) => (i === 70 ? undefined : i < 10 ? reject() : board()));
    const { settling } = summariseSide(outcomes);
    expect(settling.map(({ boards }) => boards)).toEqual([20, 40, 60]);
    expect(settling[0]!.share).toBe(0.5);
    expect(settling[2]!.share).toBeCloseTo(50 / 60, 12);
  });
  it('nothing done yet is nothing, without an error', () => {
    expect(summariseSide(new Array(20).fill(undefined))).toMatchObject({
      firstPass: { count: 0, of: 0, low: 0, high: 1 },
      boardSeconds: 0,
      settling: [],
    });
  });
});

describe('both on the same boards', () => {
  it('pairs only boards that both judged', () => {
    const pair = summarisePair(
      [board(), reject(), board(), undefined, board()],
      [reject(), board(), board(), board(), noVerdict],
    );
    expect(pair).toMatchObject({ onlyDraft: 1, onlyReleased: 1, difference: { value: 0 } });
  });
});
