import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { findRoot } from '@/lib/circuit/find-root';

describe('findRoot', () => {
  it('finds the zero of a cubic between its ends, whichever way it runs', () => {
    fc.assert(
      fc.property(fc.double({ min: -5, max: 5, noNaN: true }), fc.boolean(), (zero, rising) => {
        const sign = rising ? 1 : -1;
        const root = findRoot((x) => sign * ((x - zero) ** 3 + (x - zero)), -6, 6, 1e-12);
        expect(root.kind === 'found' && Math.abs(root.x - zero)).toBeLessThan(1e-9);
      }),
    );
  });

  it('is not stalled by a function that is flat on one side', () => {
    const root = findRoot((x) => Math.exp(40 * x) - 1e-3, -10, 5, 1e-12);
    expect(root.kind === 'found' && root.x).toBeCloseTo(Math.log(1e-3) / 40, 9);
  });

  it('returns notBracketed when the ends have the same sign or are no numbers', () => {
    expect(findRoot((x) => x * x + 1, -1, 1, 1e-9)).toEqual({ kind: 'notBracketed' });
    expect(findRoot(() => NaN, -1, 1, 1e-9)).toEqual({ kind: 'notBracketed' });
  });

  it('takes an end that is the zero', () => {
    expect(findRoot((x) => x - 1, 1, 2, 1e-9)).toEqual({ kind: 'found', x: 1 });
    expect(findRoot((x) => x - 2, 1, 2, 1e-9)).toEqual({ kind: 'found', x: 2 });
  });
});
