import { describe, expect, it } from 'vitest';
import { clopperPearson } from '@/lib/statistics/proportions/clopper-pearson';
import { newcombeDifference } from '@/lib/statistics/proportions/newcombe-difference';
import { wilson } from '@/lib/statistics/proportions/wilson';
import reference from './proportion-intervals.json';

// binom.test and prop.test of R 4.2.2; the file names its source.
describe.each(reference.cases)('interval of $x in $n at $conf', (c) => {
  it('exact, two-sided and one-sided', () => {
    const both = clopperPearson(c.x, c.n, c.conf);
    expect(both.low).toBeCloseTo(c.cp_lo, 9);
    expect(both.high).toBeCloseTo(c.cp_hi, 9);
    const oneSided = clopperPearson(c.x, c.n, 2 * c.conf - 1);
    expect(oneSided.high).toBeCloseTo(c.cp_one_sided_upper, 9);
    expect(oneSided.low).toBeCloseTo(c.cp_one_sided_lower, 9);
  });
  it('by scores', () => {
    const { low, high } = wilson(c.x, c.n, c.conf);
    expect(low).toBeCloseTo(c.wilson_lo, 9);
    expect(high).toBeCloseTo(c.wilson_hi, 9);
  });
});

describe('difference of two shares', () => {
  // R. G. Newcombe, Statistics in Medicine 17 (1998), table II, method 10: (a) 56/70 against 48/80; (f) 10/10 against 0/20.
  it.each([
    [56, 70, 48, 80, 0.0524, 0.3339],
    [9, 10, 3, 10, 0.1705, 0.809],
    [10, 10, 0, 20, 0.6791, 1],
    [10, 10, 0, 10, 0.6075, 1],
  ])('%i/%i against %i/%i', (x, m, y, n, low, high) => {
    const found = newcombeDifference({ successes: x, trials: m }, { successes: y, trials: n });
    expect(found.low).toBeCloseTo(low, 4);
    expect(found.high).toBeCloseTo(high, 4);
  });
});
