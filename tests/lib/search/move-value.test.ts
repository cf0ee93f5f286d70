import { describe, expect, test } from 'vitest';
import { weighBelief } from '@/lib/search/belief';
import { edgeSd, flatPosterior, lapseRate, rebuildPosterior } from '@/lib/search/grid-posterior';
import { furthestQuietMove, valueMove } from '@/lib/search/move-value';
import { binaryEntropy, normalCdf } from '@/lib/search/normal-distribution';
import { overshootPrior } from '@/lib/search/overshoot-range';

const noise = 1e-3;
const overshoot = overshootPrior(0.05);
const window = { low: 9, cell: 0.5e-3, cells: 80 };
const probes = [{ from: 9.3, to: 9.028, flipped: false, extraVariance: 0 }];
const posterior = rebuildPosterior(window, probes, noise, overshoot);
const belief = weighBelief(posterior, new Float64Array(window.cells).fill(1));

const entropy = (p: number) => (p <= 0 || p >= 1 ? 0 : -p * Math.log(p) - (1 - p) * Math.log(1 - p));

/** Mutual information between threshold and answer, term by term from its definition. */
function informationByDefinition(from: number, to: number) {
  const sd = edgeSd(noise, Math.abs(from - to), window.cell, 0);
  let flips = 0;
  let conditional = 0;
  for (let i = 0; i < window.cells; i++) {
    const threshold = window.low + (i + 0.5) * window.cell;
    let own = 0;
    let flip = 0;
    posterior.overshoots.forEach((u, k) => {
      const mass = belief.mass[k * window.cells + i]!;
      own += mass;
      const lowest = to - u * Math.max(0, from - to);
      flip += mass * (lapseRate + (1 - 2 * lapseRate) * normalCdf((threshold - lowest) / sd));
    });
    flips += flip;
    if (own > 0) conditional += own * entropy(flip / own);
  }
  return { flipChance: flips, information: entropy(flips) - conditional };
}

describe('valueMove', () => {
  test.each([
    [9.06, 9.02],
    [9.4, 9.035],
    [9.02, 9.02],
    [9.01, 9.025],
    [10.5, 9.04],
  ])('from %d to %d gives the mutual information of the definition', (from, to) => {
    const value = { flipChance: 0, information: 0 };
    valueMove(belief, from, to, noise, value);
    const expected = informationByDefinition(from, to);
    expect(Math.abs(value.flipChance - expected.flipChance)).toBeLessThan(2e-3);
    expect(Math.abs(value.information - expected.information)).toBeLessThan(5e-3);
  });

  test('never promises more than one bit', () => {
    const value = { flipChance: 0, information: 0 };
    for (let to = 8.99; to < 9.06; to += 1e-3) {
      valueMove(belief, 9.1, to, noise, value);
      expect(value.information).toBeLessThanOrEqual(Math.LN2 + 1e-9);
      expect(value.information).toBeGreaterThanOrEqual(0);
    }
  });
});

test('the furthest quiet move flips with about the chance allowed', () => {
  const to = furthestQuietMove(belief, 9.3, 8.9, noise, 0.12);
  const value = { flipChance: 0, information: 0 };
  valueMove(belief, 9.3, to, noise, value);
  expect(value.flipChance).toBeLessThanOrEqual(0.12);
  expect(value.flipChance).toBeGreaterThan(0.1);
});

test('a flat posterior sums to one and follows the window', () => {
  const flat = flatPosterior(window, overshoot);
  expect(flat.mass.reduce((sum, mass) => sum + mass, 0)).toBeCloseTo(1, 12);
});

describe('tables', () => {
  // Abramowitz and Stegun, table 26.1.
  test.each([
    [0, 0.5],
    [1, 0.8413447461],
    [-1.96, 0.0249978951],
    [2.5758293, 0.995],
    [-4, 3.16712e-5],
  ])('the normal distribution function at %d is %d within 2e-5', (t, expected) => {
    expect(Math.abs(normalCdf(t) - expected)).toBeLessThan(2e-5);
  });

  test('the entropy of a fair coin is ln 2', () => {
    expect(binaryEntropy(0.5)).toBeCloseTo(Math.LN2, 9);
    expect(binaryEntropy(0)).toBe(0);
    expect(Math.abs(binaryEntropy(0.005) - entropy(0.005))).toBeLessThan(1e-3);
  });
});
