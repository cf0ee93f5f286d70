import { beginFollowed, observeFollowed } from './followed';
import { observeWillNotTurn } from './prompts';
import { finishTrimmed, startState, type TrimState } from './state';
import { beginTwoBeeps, observeBeeps } from './two-beeps';
import type { FoundPoints, TrimCommand, TrimObservation, TrimSettings } from './types';
import { isOnTarget } from './verify';
import { beginWaited, observeWaited } from './waited';
import { beginProbed, observeProbed } from './wiper-probe';

export type { TrimState } from './state';
export { viewTrim } from './view';

/** Starts a trim of a board whose points were just found. Its first command may already be `finished`. */
export function beginTrim(settings: TrimSettings, found: FoundPoints, atMs: number): TrimState {
  const state = startState(settings, found, atMs);
  if (isOnTarget(state)) return finishTrimmed(state);
  switch (settings.procedure) {
    case 'two-beeps':
      return beginTwoBeeps(state);
    case 'prompted':
      return settings.fastLink ? beginFollowed(state) : beginWaited(state);
    case 'wiper-probe':
      return beginProbed(state);
  }
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
  switch (phase.kind) {
    case 'start':
      return now;
    case 'beeps':
      return observeBeeps(now, phase, seen);
    case 'followed':
      return observeFollowed(now, phase, seen);
    case 'waited':
      return observeWaited(now, phase, seen);
    case 'probed':
      return observeProbed(now, phase, seen);
  }
}
