import type { OutputState } from '../search/types';
import { supplyLimits, waitingOutput, type BeepWatch } from './beep-watch';
import type { TrimState } from './state';
import { moveWithoutPassing } from './supply-path';

/**
 * A look at where the watched point is while nothing was heard: first a little nearer to the hold than it was (an answer
 * there is movement as asked), then a little farther (silence there is the wrong way), then on until it answers, which
 * brackets how far it went. Undershoot stays short of each place, and an answer disarms the output.
 */
export interface PeekPlace {
  look: 'nearer' | 'farther';
  volts: number;
  /** How many times the distance was doubled. */
  doublings: number;
}

/** What a finished peek tells; volts are those of the watched point. */
export type PeekFinding =
  | { kind: 'moved'; pastVolts: number }
  | { kind: 'unmoved' }
  /** Not gone the wrong way; whether it moved as asked could not be looked at. */
  | { kind: 'not-away' }
  | { kind: 'away'; fromVolts: number; toVolts: number };

const sign = (watch: BeepWatch) => (watch.rising ? 1 : -1);

/** So close to the hold a movement cannot be told from the beep. */
const roomVolts = 0.005;

/** The nearer place, where there is room before the hold. */
function nearerPlace(state: TrimState, watch: BeepWatch): PeekPlace | null {
  if (watch.nearVolts === null) return null;
  const volts = watch.nearVolts + sign(watch) * state.pace.peekVolts;
  return sign(watch) * (watch.holdVolts - volts) > roomVolts ? { look: 'nearer', volts, doublings: 0 } : null;
}

/** A place farther than ever, inside the supply's range; null where the range ends before it. */
function fartherPlace(state: TrimState, watch: BeepWatch, doublings: number): PeekPlace | null {
  if (watch.farVolts === null) return null;
  const { minVolts, maxVolts } = supplyLimits(state);
  const volts = watch.farVolts - sign(watch) * state.pace.peekVolts * 2 ** doublings;
  return volts > minVolts && volts < maxVolts ? { look: 'farther', volts, doublings } : null;
}

export function firstPlace(state: TrimState, watch: BeepWatch): PeekPlace | null {
  return nearerPlace(state, watch) ?? fartherPlace(state, watch, 0);
}

/** The supply goes to the place; its observation is judged by `judgePeek`. */
export function lookAt(state: TrimState, place: PeekPlace): TrimState {
  const path = moveWithoutPassing(state.supplyVolts ?? place.volts, place.volts, supplyLimits(state));
  return { ...state, command: { kind: 'hold', ...path } };
}

/** The next place to look at, or what the peek found. */
export function judgePeek(
  state: TrimState,
  watch: BeepWatch,
  place: PeekPlace,
  output: OutputState,
): { next: PeekPlace } | PeekFinding {
  const answered = output !== waitingOutput(watch);
  if (place.look === 'nearer') {
    if (answered) return { kind: 'moved', pastVolts: place.volts };
    const next = fartherPlace(state, watch, 0);
    return next ? { next } : { kind: 'not-away' };
  }
  const distance = state.pace.peekVolts * 2 ** place.doublings;
  if (answered && place.doublings === 0) return { kind: nearerPlace(state, watch) ? 'unmoved' : 'not-away' };
  const fromVolts = place.volts + (sign(watch) * distance) / 2;
  if (answered) return { kind: 'away', fromVolts, toVolts: place.volts };
  const next = fartherPlace(state, watch, place.doublings + 1);
  return next ? { next } : { kind: 'away', fromVolts, toVolts: place.volts };
}
