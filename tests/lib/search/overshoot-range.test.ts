import { describe, expect, test } from 'vitest';
import { learnableOvershootRange, overshootIsLearnable, overshootPrior } from '@/lib/search/overshoot-range';
import { pointsOf, searchInTest } from './search-in-test';

test.each([
  [0.019, false],
  [0.02, true],
  [0.05, true],
  [0.08, true],
  [0.081, false],
  [Number.NaN, false],
])('a commissioned overshoot of %d may be searched with: %s', (overshoot, learnable) => {
  expect(overshootIsLearnable(overshoot)).toBe(learnable);
});

describe('overshootPrior', () => {
  test.each([learnableOvershootRange.min, 0.037, 0.05, learnableOvershootRange.max])(
    'of %d sums to one, peaks there and reaches past it on both sides',
    (commissioned) => {
      const { values, weights } = overshootPrior(commissioned);
      expect(weights.reduce((sum, weight) => sum + weight, 0)).toBeCloseTo(1, 12);
      expect(values[weights.indexOf(Math.max(...weights))]).toBeCloseTo(commissioned, 12);
      expect(Math.min(...values)).toBeLessThan(commissioned);
      expect(Math.max(...values)).toBeGreaterThan(commissioned);
      expect(Math.min(...values)).toBeGreaterThan(0);
    },
  );
});

test.each([
  [0.02, 0.02],
  [0.08, 0.08],
  [0.05, 0.03],
  [0.05, 0.07],
])('commissioned at %d, a supply that rings by %d is learnt', (overshoot, real) => {
  for (let seed = 1; seed <= 6; seed++) {
    const { result } = searchInTest(
      { trip: 9.3, release: 9.95 },
      { settings: { overshoot }, plant: { overshoot: { falling: real, rising: real } }, seed },
    );
    const { trip, release } = pointsOf(result);
    expect(Math.abs(trip.volts - 9.3)).toBeLessThan(3e-3);
    expect(Math.abs(release.volts - 9.95)).toBeLessThan(3e-3);
  }
});
