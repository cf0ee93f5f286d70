import { describe, expect, test } from 'vitest';
import { lotPrior } from '@/lib/search/lot-prior';
import { seededRandom } from '../../figures/random';

const lot = (boards: number, seed = 1, tripSd = 0.2, hysteresisSd = 0.05) => {
  const random = seededRandom(seed);
  return Array.from({ length: boards }, () => ({
    tripVolts: random.normal(9.5, tripSd),
    hysteresisVolts: random.normal(0.6, hysteresisSd),
  }));
};

describe('lotPrior', () => {
  test('is null before ten boards are known', () => {
    expect(lotPrior(lot(9))).toBeNull();
    expect(lotPrior(lot(10))).not.toBeNull();
  });

  test('estimates middle and spread of a large lot within 10 %', () => {
    const prior = lotPrior(lot(2000))!;
    expect(prior.tripMeanVolts).toBeCloseTo(9.5, 1);
    expect(Math.abs(prior.tripSdVolts / 0.2 - 1)).toBeLessThan(0.1);
    expect(Math.abs(prior.hysteresisSdVolts / 0.05 - 1)).toBeLessThan(0.1);
  });

  test('is not moved far by two defective boards of twelve', () => {
    const boards = lot(12);
    const clean = lotPrior(boards)!;
    const spoilt = lotPrior([
      ...boards.slice(0, 10),
      { tripVolts: 6.5, hysteresisVolts: 0 },
      { tripVolts: 11.9, hysteresisVolts: 2.4 },
    ])!;
    expect(Math.abs(spoilt.tripMeanVolts - clean.tripMeanVolts)).toBeLessThan(0.15);
    expect(spoilt.tripSdVolts).toBeLessThan(2.5 * 0.2);
  });

  test('does not depend on the order of the boards', () => {
    const boards = lot(20);
    expect(lotPrior([...boards].reverse())).toEqual(lotPrior(boards));
  });

  test('is never narrower than what was studied, though all boards be alike', () => {
    const alike = Array.from({ length: 15 }, () => ({ tripVolts: 9.5, hysteresisVolts: 0.6 }));
    expect(lotPrior(alike)).toEqual({
      tripMeanVolts: 9.5,
      tripSdVolts: 0.03,
      hysteresisMeanVolts: 0.6,
      hysteresisSdVolts: 0.02,
    });
  });
});
