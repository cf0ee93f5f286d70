import { describe, expect, it } from 'vitest';
import { combineContributions } from '@/lib/uncertainty/combine';
import { coverageFactor } from '@/lib/uncertainty/student-t';

describe('coverage factor', () => {
  // Values of R 4.2.2, qt((1 + p) / 2, nu); layout of JCGM 100:2008 table G.2.
  it.each([
    [1, 1.837409, 6.313752, 12.706205, 13.967811, 63.656741, 235.783687],
    [2, 1.321315, 2.919986, 4.302653, 4.526551, 9.924843, 19.206016],
    [3, 1.196913, 2.353363, 3.182446, 3.30683, 5.840909, 9.218702],
    [4, 1.141655, 2.131847, 2.776445, 2.869315, 4.604095, 6.620072],
    [5, 1.110533, 2.015048, 2.570582, 2.648654, 4.032143, 5.506985],
    [6, 1.090595, 1.94318, 2.446912, 2.516528, 3.707428, 4.90399],
    [8, 1.066553, 1.859548, 2.306004, 2.366419, 3.355387, 4.276577],
    [10, 1.052586, 1.812461, 2.228139, 2.283682, 3.169273, 3.95689],
    [12, 1.043463, 1.782288, 2.178813, 2.231351, 3.05454, 3.764235],
    [16, 1.032265, 1.745884, 2.119905, 2.168943, 2.920782, 3.544092],
    [20, 1.025656, 1.724718, 2.085963, 2.133028, 2.84534, 3.422119],
    [30, 1.016969, 1.697261, 2.042272, 2.086847, 2.749996, 3.270305],
    [50, 1.010123, 1.675905, 2.008559, 2.051251, 2.677793, 3.157121],
    [Infinity, 1.000022, 1.644854, 1.959964, 2.000002, 2.575829, 2.999977],
  ])('of %d degrees of freedom agrees with the tabulated quantiles to six figures', (nu, ...expected) => {
    const coverages = [0.6827, 0.9, 0.95, 0.9545, 0.99, 0.9973];
    coverages.forEach((p, i) => expect(coverageFactor(p, nu) / expected[i]! - 1).toBeCloseTo(0, 6));
  });
  it('does not need whole degrees of freedom', () => {
    expect(coverageFactor(0.95, 2.5)).toBeGreaterThan(coverageFactor(0.95, 3));
    expect(coverageFactor(0.95, 2.5)).toBeLessThan(coverageFactor(0.95, 2));
  });
});

describe('combined uncertainty', () => {
  // JCGM 100:2008 H.1, contributions as rounded there: u = 32 nm, 16 degrees of freedom.
  it('reproduces the end-gauge example of the GUM', () => {
    const parts = [
      [25, 18],
      [9.7, 25.6],
      [2.9, 50],
      [16.6, 2],
    ];
    const combined = combineContributions(
      parts.map(([standard, degrees]) => ({
        name: 'repeatability',
        distribution: 'normal',
        standard: standard!,
        degrees: degrees!,
      })),
    );
    expect(combined.standard).toBeCloseTo(Math.sqrt(1003.06), 6);
    expect(combined.effectiveDegrees).toBe(16);
    expect(coverageFactor(0.99, combined.effectiveDegrees)).toBeCloseTo(2.9208, 4);
  });
  // Own budget, computed with R 4.2.2: u_c, effective degrees, k at 95.45 %.
  it('reproduces a budget dominated by few repeats', () => {
    const combined = combineContributions([
      { name: 'repeatability', distribution: 'normal', standard: 0.0024, degrees: 9 },
      { name: 'meter-gain', distribution: 'normal', standard: 0.001, degrees: Infinity },
      { name: 'search', distribution: 'rectangular', standard: 0.001 / Math.sqrt(3), degrees: Infinity },
    ]);
    expect(combined.standard).toBeCloseTo(0.002663331247, 10);
    expect(combined.effectiveDegrees).toBe(13);
    expect(combined.coverageFactor).toBeCloseTo(2.211800697, 6);
    expect(combined.expanded).toBeCloseTo(0.00589075791, 8);
  });
  it('has the normal factor when nothing was estimated from repeats', () => {
    const combined = combineContributions([
      { name: 'meter-offset', distribution: 'rectangular', standard: 1, degrees: Infinity },
    ]);
    expect(combined.coverageFactor).toBeCloseTo(2, 3);
  });
});
