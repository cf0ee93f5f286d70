import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { seededRandom } from '../random';
import { methods } from './methods';
import { populations } from './population';
import { targetRows } from './rows';
import { settingsOf } from './settings';
import { StackPlant } from './stack-plant';

const settings = settingsOf(targetRows.fine);
const noiseVolts = 1e-3;

describe('the search over SCPI bytes', () => {
  let plant: StackPlant;
  beforeAll(async () => {
    plant = await StackPlant.open({
      seed: 11,
      baudRate: 115200,
      overshoot: 0.05,
      supplyMinVolts: settings.supplyMinVolts,
      overvoltageVolts: settings.supplyMaxVolts,
    });
  });
  afterAll(() => plant.close());

  test.each([1, 2, 3])('lands within 3 mV of the points of board %d by the meter', async (i) => {
    const board = populations.ordinary(seededRandom(i));
    const found = await methods.search(plant, settings, await plant.seat(board, noiseVolts));
    expect(found.kind).toBe('found');
    expect(Math.abs(found.trip! - board.trip)).toBeLessThan(3e-3);
    expect(Math.abs(found.release! - board.release)).toBeLessThan(3e-3);
  });

  test.each(['stuckOn', 'stuckOff'] as const)('tells a board that is %s', async (population) => {
    const board = populations[population]();
    const found = await methods.search(plant, settings, await plant.seat(board, noiseVolts));
    expect(found.kind).toBe(population === 'stuckOn' ? 'stuck-on' : 'stuck-off');
  });

  test('a bisection that re-arms by large steps is wrong by tens of millivolts on the same bench', async () => {
    const peaking = await StackPlant.open({
      seed: 12,
      baudRate: 115200,
      overshoot: 0.05,
      supplyMinVolts: settings.supplyMinVolts,
      overvoltageVolts: settings.supplyMaxVolts + 1,
    });
    const board = populations.ordinary(seededRandom(4));
    const found = await methods['bisection, re-armed'](peaking, settings, await peaking.seat(board, noiseVolts));
    await peaking.close();
    expect(found.trip! - board.trip).toBeGreaterThan(0.02);
  });
});
