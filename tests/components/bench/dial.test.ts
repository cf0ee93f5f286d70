import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { dialShape, polar } from '@/components/bench/dial/spiral';
import { turnsBetween, turnsOfKey } from '@/components/bench/hands/screw-turning';
import { fractionOf } from '@/components/bench/turn-words';

const numbers = (path: string) => [...path.matchAll(/-?\d+\.\d+/g)].map((m) => Number(m[0]));

describe('the trim dial', () => {
  it('turns clockwise to the right and anticlockwise to the left', () => {
    expect(polar(0.25, 100, 1).x).toBeGreaterThan(300);
    expect(polar(0.25, 100, -1).x).toBeLessThan(300);
    expect(polar(0, 100, 1).y).toBeLessThan(300);
  });

  it('stays inside its bezel for every turn up to four', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 4, noNaN: true }),
        fc.constantFrom(1 as const, -1 as const),
        (turns, sense) => {
          const shape = dialShape(turns, sense, true);
          const path = numbers(shape.arrow);
          for (let i = 0; i < path.length; i += 2) {
            const away = Math.hypot(path[i]! - 300, path[i + 1]! - 300);
            expect(away).toBeLessThan(shape.bezel);
            expect(away).toBeGreaterThan(shape.screw - 40);
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  it('numbers whole turns, but not under the arrowhead', () => {
    expect(dialShape(1.75, 1, true).counters.map(({ turn }) => turn)).toEqual([1]);
    expect(dialShape(3.5, 1, true).counters.map(({ turn }) => turn)).toEqual([1, 2, 3]);
    expect(dialShape(1, 1, true).counters).toEqual([]);
  });

  it('marks the exact end, also where the words are rounded', () => {
    expect(dialShape(1.7, 1, true).endSlotDegrees).toBeCloseTo(252, 5);
    expect(dialShape(1.7, -1, true).endSlotDegrees).toBeCloseTo(-252, 5);
  });

  it('draws no end slot where it would cover the present one', () => {
    expect(dialShape(2, 1, true).endSlotDegrees).toBeNull();
    expect(dialShape(1.5, 1, true).endSlotDegrees).toBeNull();
  });

  it('grows the screw below a quarter turn', () => {
    expect(dialShape(0.2, 1, false).screw).toBeGreaterThan(dialShape(0.3, 1, false).screw);
  });
});

describe('the words of a turn', () => {
  it('reduces eighths', () => {
    expect([0, 1, 2, 3, 4, 5, 6, 7].map(fractionOf)).toEqual([
      null,
      [1, 8],
      [1, 4],
      [3, 8],
      [1, 2],
      [5, 8],
      [3, 4],
      [7, 8],
    ]);
  });
});

describe('the simulated screw', () => {
  it('takes the shorter way round', () => {
    expect(turnsBetween(3.1, -3.1)).toBeCloseTo((2 * Math.PI - 6.2) / (2 * Math.PI), 6);
    expect(turnsBetween(0, Math.PI / 2)).toBeCloseTo(0.25, 6);
  });

  it('turns clockwise with the right arrow and a whole turn with the page keys', () => {
    expect(turnsOfKey('ArrowRight')).toBeGreaterThan(0);
    expect(turnsOfKey('ArrowLeft')).toBeLessThan(0);
    expect(turnsOfKey('PageUp')).toBe(1);
    expect(turnsOfKey('a')).toBeNull();
  });
});
