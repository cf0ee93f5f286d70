import type { SearchPrior } from '../../../lib/search/types';
import type { MethodName } from './methods';
import { type PopulationName, tightLot, wideLot } from './population';

export interface SearchRow {
  name: string;
  method: MethodName;
  population: PopulationName;
  boards: number;
  noiseMillivolts: number;
  wantedMillivolts: number;
  mostSettles: number;
  volts: 12 | 24;
  overshoot: number;
  prior: SearchPrior | null;
}

const targetBoards = 2000;
const usualBoards = 500;
const slowRampBoards = 200;

const usual: Omit<SearchRow, 'name'> = {
  method: 'search',
  population: 'ordinary',
  boards: usualBoards,
  noiseMillivolts: 1,
  wantedMillivolts: 0.5,
  mostSettles: 150,
  volts: 12,
  overshoot: 0.05,
  prior: null,
};

/** A wanted uncertainty whose RMS error stays below 0.75 mV. */
const quickMillivolts = 0.82;

export const targetRows = {
  fine: { ...usual, name: 'no prior', boards: targetBoards },
  quick: { ...usual, name: 'no prior, quick', boards: targetBoards, wantedMillivolts: quickMillivolts },
  prior: { ...usual, name: 'prior 30 mV', boards: targetBoards, population: 'tightLot', prior: tightLot },
} satisfies Record<string, SearchRow>;

const noisy = { noiseMillivolts: 3, mostSettles: 400 };

const searchRows: SearchRow[] = [
  ...Object.values(targetRows),
  { ...usual, name: 'no prior', noiseMillivolts: 0 },
  { ...usual, name: 'no prior', ...noisy },
  { ...usual, name: 'no prior, at most 80', noiseMillivolts: 3, wantedMillivolts: 1, mostSettles: 80 },
  { ...usual, name: 'prior 30 mV', population: 'tightLot', prior: tightLot, noiseMillivolts: 0 },
  { ...usual, name: 'prior 30 mV', population: 'tightLot', prior: tightLot, ...noisy },
  { ...usual, name: 'prior 300 mV', population: 'wideLot', prior: wideLot },
  { ...usual, name: 'hysteresis 0', population: 'noHysteresis' },
  { ...usual, name: 'hysteresis 0.05 V', population: 'smallHysteresis' },
  { ...usual, name: 'hysteresis 2 V', population: 'largeHysteresis' },
  { ...usual, name: '1 V outside the prior', population: 'besideTightLot', prior: tightLot },
  { ...usual, name: 'outside the range', population: 'outsideRange' },
  { ...usual, name: '2 % mixed defects', population: 'mixed' },
  { ...usual, name: 'stuck on', population: 'stuckOn' },
  { ...usual, name: 'stuck off', population: 'stuckOff' },
  { ...usual, name: '24 V', population: 'volts24', volts: 24 },
  { ...usual, name: '24 V, hysteresis 4 V', population: 'volts24LargeHysteresis', volts: 24 },
  ...[0.02, 0.03, 0.04, 0.06, 0.07, 0.08].map((overshoot) => ({
    ...usual,
    name: `overshoot ${Math.round(overshoot * 100)} %`,
    overshoot,
  })),
];

const baselines: MethodName[] = ['ramp 10 mV', 'coarse 100 mV + fine 1 mV', 'bisection, re-armed', 'ramp 1 mV'];

export const rows: SearchRow[] = [
  ...searchRows,
  ...baselines.flatMap((method) =>
    [0, 1, 3].map((noiseMillivolts) => ({
      ...usual,
      name: method,
      method,
      noiseMillivolts,
      boards: method === 'ramp 1 mV' ? slowRampBoards : usualBoards,
    })),
  ),
];
