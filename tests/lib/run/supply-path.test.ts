import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { pathWithin } from '@/lib/run/supply-path';

const volts = fc.double({ min: 0, max: 30, noNaN: true });
const overshoot = fc.double({ min: 0.01, max: 0.085, noNaN: true });

describe('a path of the supply', () => {
  it('ends at the volts asked for', () => {
    fc.assert(fc.property(volts, volts, overshoot, (from, to, u) => pathWithin(from, to, to, u).at(-1) === to));
  });
  it('never peaks beyond its bound by more than is negligible', () => {
    fc.assert(
      fc.property(volts, volts, fc.double({ min: 0, max: 3, noNaN: true }), overshoot, (from, to, beyond, u) => {
        const direction = Math.sign(to - from);
        const bound = to + direction * beyond;
        let at = from;
        for (const next of pathWithin(from, to, bound, u)) {
          const peak = next + u * (next - at);
          expect((peak - bound) * direction).toBeLessThan(0.00071);
          at = next;
        }
      }),
    );
  });
  it('is one step where the bound is far enough', () => {
    expect(pathWithin(7, 13.5, 15, 0.05)).toEqual([13.5]);
    expect(pathWithin(12, 12, 15, 0.05)).toEqual([12]);
  });
  it('lands short of a near bound first', () => {
    const path = pathWithin(7, 13.5, 13.5, 0.05);
    expect(path.length).toBeGreaterThan(1);
    expect(path[0]! + 0.05 * (path[0]! - 7)).toBeCloseTo(13.5, 9);
  });
});
