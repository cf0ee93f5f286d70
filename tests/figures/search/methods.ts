import { beginSearch, nextSearchCommand, observeSearch } from '../../../lib/search/search';
import type { SearchResult, SearchSettings } from '../../../lib/search/types';
import type { Plant } from '../plant';
import { Ramp } from './baselines';

/** What a method came to. Volts; null where it gives no point. */
export interface Found {
  kind: SearchResult['kind'];
  trip: number | null;
  release: number | null;
  /** Commands before the end check, waypoints included. */
  settles: number;
  endCheckSettles: number;
}

export interface Start {
  volts: number;
  output: 'on' | 'off';
}

/** The product's search over any plant. */
export async function searchBoard(plant: Plant, settings: SearchSettings, start: Start): Promise<Found> {
  let state = beginSearch(settings, start);
  for (;;) {
    const command = nextSearchCommand(state);
    if (command.kind === 'finished') {
      const { result } = command;
      const points = 'trip' in result ? result : { trip: null, release: null };
      return {
        kind: result.kind,
        trip: points.trip?.volts ?? null,
        release: points.release?.volts ?? null,
        settles: result.settles,
        endCheckSettles: result.endCheckSettles,
      };
    }
    state = observeSearch(state, await plant.apply(command.volts, command.dwell));
  }
}

export const methods = {
  search: searchBoard,
  'ramp 10 mV': (plant: Plant, settings: SearchSettings, start: Start) => new Ramp(plant, settings, start).ramp(0.01),
  'ramp 1 mV': (plant: Plant, settings: SearchSettings, start: Start) => new Ramp(plant, settings, start).ramp(0.001),
  'coarse 100 mV + fine 1 mV': (plant: Plant, settings: SearchSettings, start: Start) =>
    new Ramp(plant, settings, start).coarsePlusFine(0.1, 0.001),
  'bisection, re-armed': (plant: Plant, settings: SearchSettings, start: Start) =>
    new Ramp(plant, settings, start).bisection(0.001),
} as const;
export type MethodName = keyof typeof methods;
