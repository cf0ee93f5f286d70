import { beginSearch, nextSearchCommand, observeSearch, type SearchState } from '@/lib/search/search';
import type { OutputState, SearchObservation, SearchResult, SearchSettings } from '@/lib/search/types';
import type { SearchedBoard } from '../../figures/plant';
import { PurePlant, type PurePlantOptions } from '../../figures/pure-plant';
import { seededRandom } from '../../figures/random';

/** The study's 12 V board: T in 8 to 11 V, H in 0.2 to 1.5 V, 1 mV of comparator noise. */
export const settings12: SearchSettings = {
  supplyMinVolts: 6,
  supplyMaxVolts: 12,
  tripMinVolts: 8,
  tripMaxVolts: 11,
  hysteresisMinVolts: 0.2,
  hysteresisMaxVolts: 1.5,
  noiseVolts: 1e-3,
  wantedUncertaintyVolts: 0.5e-3,
  mostSettles: 150,
  overshoot: 0.05,
  endCheck: true,
};

export interface Searched {
  result: SearchResult;
  state: SearchState;
  plant: PurePlant;
  start: { volts: number; output: OutputState };
  commands: { volts: number; dwell: 'settle' | 'waypoint'; fromVolts: number }[];
  observations: SearchObservation[];
}

export interface SearchInTest {
  settings?: Partial<SearchSettings>;
  plant?: Partial<PurePlantOptions>;
  seed?: number;
  /** Called before each command is applied; may change the board, or return another state. */
  before?: (state: SearchState, board: SearchedBoard) => SearchState | void;
}

/** Searches one board on the pure plant. More commands than any search may need end the test. */
export function searchInTest(board: SearchedBoard, test: SearchInTest = {}): Searched {
  const settings = { ...settings12, ...test.settings };
  const changing = { ...board };
  const plant = new PurePlant(
    changing,
    {
      startVolts: settings.supplyMinVolts,
      noiseVolts: settings.noiseVolts,
      overshoot: { falling: 0.05, rising: 0.05 },
      ...test.plant,
    },
    seededRandom(test.seed ?? 1),
  );
  const start = { volts: plant.volts, output: plant.output };
  let state = beginSearch(settings, start);
  const commands: Searched['commands'] = [];
  const observations: SearchObservation[] = [];
  for (;;) {
    state = test.before?.(state, changing) ?? state;
    const command = nextSearchCommand(state);
    if (command.kind === 'finished') return { result: command.result, state, plant, start, commands, observations };
    if (commands.length > 3 * settings.mostSettles) throw new Error('The search does not end.');
    commands.push({ volts: command.volts, dwell: command.dwell, fromVolts: plant.volts });
    const seen = plant.apply(command.volts, command.dwell);
    observations.push(seen);
    state = observeSearch(state, seen);
  }
}

/** Both points of a result that has them; fails the test otherwise. */
export function pointsOf(result: SearchResult) {
  if (result.kind !== 'found' && result.kind !== 'chatter') throw new Error(`The search ended ${result.kind}.`);
  return result;
}
