import type { SearchResult } from '../../../lib/search/types';
import { nextTrimCommand, observeTrim, type TrimState } from '../../../lib/trim/trim';
import type { TrimCommand, TrimObservation } from '../../../lib/trim/types';

type Answer = TrimObservation extends infer Each ? (Each extends unknown ? Omit<Each, 'atMs'> : never) : never;

const counts = { settles: 30, waypoints: 8, endCheckSettles: 7 };

export const foundAt = (tripVolts: number, releaseVolts = tripVolts + 0.4): SearchResult => ({
  kind: 'found',
  trip: { volts: tripVolts, standardUncertaintyVolts: 0.0008 },
  release: { volts: releaseVolts, standardUncertaintyVolts: 0.0008 },
  ...counts,
});
export const unresolved: SearchResult = { kind: 'unresolved', trip: null, release: null, ...counts };

/**
 * Answers commands until the trim ends or `until` holds; `answer` may leave a kind to the default: supply where it was
 * sent, output still waiting, time passing. Ends the test after 20,000 commands.
 */
export function drive(
  start: TrimState,
  answer: (command: TrimCommand, state: TrimState) => Answer | undefined,
  until: (state: TrimState) => boolean = () => false,
): TrimState {
  let state = start;
  for (let count = 0; count < 20_000; count++) {
    const command = nextTrimCommand(state);
    if (command.kind === 'finished' || until(state)) return state;
    const seen = answer(command, state) ?? usual(command);
    state = observeTrim(state, { ...seen, atMs: state.atMs + secondsOf(command) * 1000 } as TrimObservation);
  }
  throw new Error('the trim did not end');
}

function usual(command: TrimCommand): Answer {
  switch (command.kind) {
    case 'hold':
      return { kind: 'held', volts: command.volts, output: 'on' };
    case 'probe':
      return { kind: 'probed', volts: command.volts, output: 'on' };
    case 'sense':
      return { kind: 'sensed', output: 'on' };
    case 'wait':
      return { kind: 'waited' };
    case 'read-wiper':
      return { kind: 'wiper', wiperVolts: 5.9, supplyVolts: 10.7 };
    default:
      throw new Error(`the test has to answer ${command.kind}`);
  }
}

function secondsOf(command: TrimCommand): number {
  if (command.kind === 'search') return 1.5;
  if (command.kind === 'wait') return command.milliseconds / 1000;
  return command.kind === 'hold' ? 0.05 + 0.04 * command.waypointsVolts.length : 0.05;
}
