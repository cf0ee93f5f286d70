import { describe, expect, it } from 'vitest';
import { betaQuantile } from '@/lib/statistics/distributions/beta-quantile';
import { chiSquareAbove, chiSquareQuantile } from '@/lib/statistics/distributions/chi-square';
import { fAbove, fQuantile } from '@/lib/statistics/distributions/f-distribution';
import { normalBelow } from '@/lib/statistics/distributions/normal';
import { normalQuantile } from '@/lib/statistics/distributions/normal-quantile';
import { tAbove, tQuantile } from '@/lib/statistics/distributions/student-t';
import reference from './distributions.json';

/** Last number of a row is R's value, the others are the arguments. Tails are compared relative to themselves. */
const functions: Record<string, (...x: number[]) => number> = {
  normalBelow: (z) => normalBelow(z!),
  normalQuantile: (p) => normalQuantile(p!),
  tAbove: (t, nu) => tAbove(t!, nu!),
  tQuantile: (p, nu) => tQuantile(p!, nu!),
  chiSquareAbove: (x, nu) => chiSquareAbove(x!, nu!),
  chiSquareQuantile: (p, nu) => chiSquareQuantile(p!, nu!),
  fAbove: (f, a, b) => fAbove(f!, a!, b!),
  fQuantile: (p, a, b) => fQuantile(p!, a!, b!),
  betaQuantile: (p, a, b) => betaQuantile(p!, a!, b!),
};

describe('distributions agree with R 4.2.2', () => {
  it.each(Object.keys(functions))('%s to ten digits', (name) => {
    const rows = reference[name as keyof typeof reference] as number[][];
    expect(rows.length).toBeGreaterThan(10);
    for (const row of rows) {
      const expected = row.at(-1)!;
      const error = Math.abs(functions[name]!(...row.slice(0, -1)) - expected) / Math.max(Math.abs(expected), 1e-300);
      expect(error, `${name}(${row.slice(0, -1).join(', ')})`).toBeLessThan(1e-10);
    }
  });
  it('refuses a probability outside 0 to 1', () => {
    expect(() => normalQuantile(1.01)).toThrow(RangeError);
    expect(() => betaQuantile(-0.1, 1, 1)).toThrow(RangeError);
  });
});
