import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lotYields, operationsOf } from '@/lib/quality/lot-yields';
import type { ReviewBoard } from '@/lib/quality/review-board';
import { allOf, board } from './boards';

const rejected = (rejectReason: ReviewBoard['rejectReason'], over: Partial<ReviewBoard> = {}) =>
  board({ verdict: 'reject', rejectReason, ...over });

describe('the operations of a lot', () => {
  it('count a board where it failed, and never in what it did not reach', () => {
    const boards = [
      board(),
      board({ trimRounds: 2 }),
      board({ trimRounds: 0 }),
      rejected('never-on', { found: allOf(null), values: allOf(null) }),
      rejected('trim-cannot-reach', { values: allOf(null) }),
      rejected('trim-no-effect', { values: allOf(null) }),
      rejected('release-too-high'),
      rejected('ride-through', { trimRounds: 3 }),
    ];
    expect(operationsOf(boards)).toEqual({
      find: { entered: 8, passedFirst: 6 },
      trim: { entered: 6, passedFirst: 3 },
      verify: { entered: 5, passedFirst: 3 },
    });
  });

  it('roll to the first-pass yield while no board needs a second trim round, and below it otherwise', () => {
    const anyBoard = fc.constantFrom(
      () => board(),
      () => rejected('never-on', { found: allOf(null) }),
      () => rejected('trim-no-effect'),
      () => rejected('release-too-high'),
    );
    fc.assert(
      fc.property(fc.array(anyBoard, { minLength: 1, maxLength: 60 }), (makers) => {
        const boards = [board(), ...makers.map((make) => make())];
        const { first, rolled } = lotYields(boards, 'exact');
        expect(rolled!.share).toBeCloseTo(first!.share, 12);
        const again = lotYields([board({ trimRounds: 2 }), ...boards], 'exact');
        expect(again.rolled!.share).toBeLessThan(again.first!.share);
      }),
    );
  });
});

describe('the yields of a lot', () => {
  it('take the first verdict for the first pass and the last one for the end', () => {
    const boards = [
      board(),
      rejected('never-on', { lastVerdict: 'pass' }),
      rejected('never-on'),
      board({ lastVerdict: 'reject' }),
    ];
    expect(lotYields(boards, 'wilson')).toMatchObject({ tested: 4, passedFirst: 2, passedLast: 2 });
  });

  it('state exact or Wilson intervals as asked, the exact ones wider', () => {
    const boards = Array.from({ length: 240 }, (_, i) => (i < 215 ? board() : rejected('release-too-high')));
    const exact = lotYields(boards, 'exact').first!;
    const wilson = lotYields(boards, 'wilson').first!;
    expect(exact.share).toBeCloseTo(215 / 240, 12);
    expect(exact.low).toBeLessThan(wilson.low);
    expect(exact.high).toBeGreaterThan(wilson.high);
  });

  it('are null before the first verdict', () => {
    expect(lotYields([], 'exact')).toMatchObject({ tested: 0, first: null, final: null, rolled: null });
  });
});
