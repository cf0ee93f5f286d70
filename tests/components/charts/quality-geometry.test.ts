import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boardKinds } from '@/components/charts/quality/board-kinds';
import { boardX, chartBox, pinnedTo, shownBoards, shownDomain } from '@/components/charts/quality/chart-scale';
import { fittedPath } from '@/components/charts/quality/histogram';
import { movingRangeOf } from '@/components/charts/quality/moving-range-of';
import { placePinned } from '@/components/charts/quality/pinned-values';
import { runBrackets } from '@/components/charts/quality/run-brackets';
import { boardsAStroke, linePath } from '@/components/charts/quality/thin-line';
import { placeAfterKey } from '@/components/desk/lots/review/use-chosen-board';
import type { RunStretch } from '@/lib/contracts/lot-review';

const limits = { min: 10.7, max: 10.9 };
const run = (from: number, to: number, over: Partial<RunStretch> = {}): RunStretch => ({
  rule: 2,
  from,
  to,
  boards: to - from + 1,
  side: 'above',
  direction: null,
  ...over,
});

describe('the axis of values', () => {
  it('shows the limits with a fifth of the tolerance beyond, however wild a value is', () => {
    const [low, high] = shownDomain({ values: [10.8, 14], limits, control: null });
    expect(low).toBeCloseTo(10.66, 9);
    expect(high).toBeCloseTo(10.94, 9);
    expect(pinnedTo([low, high], 11.02)).toBe('high');
    expect(pinnedTo([low, high], 10.61)).toBe('low');
    expect(pinnedTo([low, high], 10.9)).toBeNull();
  });

  it('always has both control limits on it, and never ends where it begins', () => {
    const volts = fc.double({ min: 0, max: 20, noNaN: true });
    fc.assert(
      fc.property(fc.array(volts, { maxLength: 40 }), volts, volts, fc.boolean(), (values, a, b, limited) => {
        const control = { lower: Math.min(a, b), upper: Math.max(a, b) };
        const [low, high] = shownDomain({ values, limits: limited ? limits : null, control });
        expect(low).toBeLessThanOrEqual(control.lower);
        expect(high).toBeGreaterThanOrEqual(control.upper);
        expect(high).toBeGreaterThan(low);
      }),
    );
  });

  it('does not reach below zero where no value does', () => {
    expect(shownDomain({ values: [0, 1, 2, 3], limits: null, control: null })[0]).toBe(0);
  });
});

describe('the axis of boards', () => {
  it('keeps room for boards ahead at a desk, and shows the newest eighty on a phone', () => {
    expect(shownBoards(12, 240, false)).toEqual({ from: 0, to: 240 });
    expect(shownBoards(240, 240, true)).toEqual({ from: 160, to: 240 });
    expect(shownBoards(12, 240, true)).toEqual({ from: 0, to: 80 });
    expect(shownBoards(3, 24, true)).toEqual({ from: 0, to: 24 });
  });

  it('spaces boards evenly inside the plot, which leaves room for the histogram and its numbers', () => {
    fc.assert(
      fc.property(fc.integer({ min: 340, max: 2_400 }), fc.integer({ min: 1, max: 5_000 }), (width, size) => {
        const box = chartBox(width);
        const x = boardX(box, { from: 0, to: size });
        expect(x(0)).toBeGreaterThanOrEqual(box.plotLeft);
        expect(x(size - 1)).toBeLessThanOrEqual(box.plotRight);
        expect(box.histLeft).toBeGreaterThan(box.plotRight);
        expect(box.histRight).toBeGreaterThan(box.histLeft);
        expect(box.histRight + 60).toBeLessThanOrEqual(width);
      }),
    );
  });
});

describe('the mark of a board', () => {
  const points = {
    serials: [],
    values: [10.8, 10.95, null, 10.81, 10.82],
    found: [],
    marks: 'PRRPP',
    endedAt: [],
    station: [],
    group: [],
  };
  it('is the red square for a reject wherever it lies, and none where nothing was measured', () => {
    const stretches = [run(1, 5), run(2, 2, { rule: 1 }), run(4, 4, { rule: 1 })];
    expect(boardKinds({ points, stretches })).toEqual(['run', 'rejected', null, 'beyond', 'run']);
  });
});

describe('a line of many boards', () => {
  it('draws every board while there are pixels for it, and strokes after that', () => {
    expect(boardsAStroke(240, 970)).toBe(1);
    expect(boardsAStroke(5_000, 970)).toBe(11);
  });

  it('keeps the lowest and the highest of every stroke', () => {
    fc.assert(
      fc.property(
        fc.array(fc.integer({ min: 0, max: 250 }), { minLength: 1, maxLength: 400 }),
        fc.integer({ min: 2, max: 20 }),
        (ys, each) => {
          const path = linePath(
            ys.map((y, x) => ({ x, y })),
            each,
          );
          const drawn = [...path.matchAll(/[ML][\d.]+ ([\d.]+)/g)].map((match) => Number(match[1]));
          expect(drawn.length).toBeLessThanOrEqual(2 * Math.ceil(ys.length / each));
          expect(Math.min(...drawn)).toBe(Math.min(...ys));
          expect(Math.max(...drawn)).toBe(Math.max(...ys));
        },
      ),
    );
  });
});

describe('brackets over runs', () => {
  const x = (place: number) => 64 + place * 4;
  it('say their words where there is room, and never over another bracket', () => {
    const [first, second] = runBrackets([run(201, 211), run(213, 240)], x, [64, 1028]);
    expect(first!.words).toMatchObject({ anchor: 'end', text: 'boards 201 to 211: 11 in a row above centre' });
    expect(second!.words).toBeNull();
  });
  it('turn to the other side at the left edge, and leave single boards alone', () => {
    const brackets = runBrackets([run(1, 9), run(30, 30, { rule: 1 })], x, [64, 1028]);
    expect(brackets).toHaveLength(1);
    expect(brackets[0]!.words!.anchor).toBe('start');
  });
});

describe('values beyond the axis', () => {
  it('get their numbers unless another one stands too close at the same edge', () => {
    const pinned = [10, 40, 120].map((x, place) => ({ place, x, value: 11, edge: 'high' as const }));
    expect(placePinned(pinned, String).map(({ text }) => text)).toEqual(['11', null, '11']);
  });
});

describe('moving ranges by board', () => {
  it('reach over boards that were not measured', () => {
    const ranges = movingRangeOf([10, null, 13, 12]);
    expect(ranges).toEqual([null, null, 3, 1]);
  });
});

describe('the fitted normal curve', () => {
  it('is highest at the mean, where it holds count times width times 0.3989 over sigma boards', () => {
    const boards: number[] = [];
    fittedPath({ count: 100, mean: 0, deviation: 2 }, 1, [-6, 6], (n) => (boards.push(n), { x: n, y: 0 }));
    expect(Math.max(...boards)).toBeCloseTo((100 * 0.3989422804) / 2, 6);
    expect(boards[30]).toBe(Math.max(...boards));
  });
});

describe('keys on a chart', () => {
  it('walk, jump and leave; other keys stay with the page', () => {
    expect(placeAfterKey('ArrowRight', null, 5)).toBe(0);
    expect(placeAfterKey('ArrowRight', 4, 5)).toBe(4);
    expect(placeAfterKey('ArrowLeft', 0, 5)).toBe(0);
    expect(placeAfterKey('End', 1, 5)).toBe(4);
    expect(placeAfterKey('Home', 3, 5)).toBe(0);
    expect(placeAfterKey('PageUp', 3, 50)).toBe(13);
    expect(placeAfterKey('Escape', 3, 5)).toBe(-1);
    expect(placeAfterKey('Escape', null, 5)).toBeNull();
    expect(placeAfterKey('Tab', 3, 5)).toBeNull();
  });
});
