import { expect, test } from 'vitest';
import { beginSupplyModel, learnSupplyLevel, setpointFor, supplyErrorAt } from '@/lib/search/supply-level';
import { seededRandom } from '../../figures/random';

/** Readings of a supply that settles at 1.0004 x + 7 mV and still rings by 2.4 % of the step when read. */
function learnt(steps: number) {
  const random = seededRandom(4);
  let model = beginSupplyModel(6, 12);
  let at = 6;
  let worst = 0;
  for (let i = 0; i < steps; i++) {
    const setpoint = random.uniform(8, 11);
    const level = 1.0004 * setpoint + 0.007;
    const reading = level - 0.024 * (at - level) + random.normal(0, 0.1e-3);
    const step = learnSupplyLevel(model, { setpoint, before: at, reading, dwell: 'settle' });
    model = step.model;
    worst = Math.abs(step.level - level);
    at = level;
  }
  return { model, worst };
}

test('learns offset, gain and ring from readings: levels within 0.5 mV after thirty steps of up to 3 V', () => {
  const { model, worst } = learnt(30);
  expect(worst).toBeLessThan(0.5e-3);
  expect(Math.abs(supplyErrorAt(model, 9.5).volts - (0.0004 * 9.5 + 0.007))).toBeLessThan(1e-3);
  expect(Math.abs(model.mean[2]! - 0.024)).toBeLessThan(1e-3);
});

test('gives the setpoint that settles at a level', () => {
  const { model } = learnt(30);
  const setpoint = setpointFor(model, 9.7);
  expect(setpoint + supplyErrorAt(model, setpoint).volts).toBeCloseTo(9.7, 5);
});

test('doubts the level of a large step before the ring is known, and says so', () => {
  const step = { setpoint: 9, before: 6, reading: 9.08, dwell: 'settle' } as const;
  const { extraVariance } = learnSupplyLevel(beginSupplyModel(6, 12), step);
  expect(Math.sqrt(extraVariance)).toBeGreaterThan(5e-3);
});
