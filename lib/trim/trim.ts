import { observeWillNotTurn } from './prompts';
export { viewTrim } from './view';
import { startState, type TrimState } from './state';
import { beginTwoBeeps, observeBeeps } from './two-beeps';
import type { FoundPoints, TrimCommand, TrimObservation, TrimSettings } from './types';

export type { TrimState } from './state';

/** Starts a trim of a board whose points were just found. Its first command may already be `finished`. */
export function beginTrim(settings: TrimSettings, found: FoundPoints, atMs: number): TrimState {
  const state = startState(settings, found, atMs);
  return beginTwoBeeps(state);
}

/** What the station is to do; the same until the next observation. */
export function nextTrimCommand(state: TrimState): TrimCommand {
  return state.command;
}

/**
 * Takes in the answer to the pending command, or what the operator says at any time. An answer to a command that is no
 * longer pending changes nothing.
 */
export function observeTrim(state: TrimState, seen: TrimObservation): TrimState {
  const { phase } = state;
  if (phase.kind === 'over') return state;
  const now = { ...state, atMs: seen.atMs };
  if (seen.kind === 'will-not-turn') return observeWillNotTurn(now);
  return phase.kind === 'beeps' ? observeBeeps(now, phase, seen) : now;
}
