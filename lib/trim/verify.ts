import type { SearchPrior, SearchResult } from '../search/types';
import { observeTrip, turnedFreely } from './board-estimate';
import { finishFailed, finishTrimmed, type TrimState } from './state';

/** Ask for the search that judges a stop: end check, and fine enough for the tolerance. */
export function askVerify(state: TrimState, prior: SearchPrior | null): TrimState {
  const wanted = Math.min(0.001, Math.max(0.0005, state.settings.toleranceVolts / 10));
  return {
    ...state,
    heldVolts: null,
    supplyVolts: null,
    command: { kind: 'search', wantedUncertaintyVolts: wanted, prior, check: true },
  };
}

/** Within the tolerance by simple acceptance: guard bands belong to the verdict after sealing. */
export function isOnTarget(state: TrimState): boolean {
  const { targetVolts, toleranceVolts } = state.settings;
  return Math.abs(state.trip.volts - targetVolts) <= toleranceVolts;
}

/**
 * The verifying search came back. Ends the trim on target, after the last round allowed or on an unsteady board, repeats an
 * unresolved search once without assumptions, and else hands the state with its new trip point to `next`.
 */
export function judgeVerify(state: TrimState, result: SearchResult, next: (state: TrimState) => TrimState): TrimState {
  if (result.kind === 'chatter') return finishFailed(state, 'not-steady');
  if (result.kind === 'unresolved') {
    if (state.searchRepeated) return finishFailed(state, 'not-steady');
    return askVerify({ ...state, searchRepeated: true }, null);
  }
  const judged = { ...withResult(state, result), rounds: state.rounds + 1, searchRepeated: false };
  if (result.kind === 'found' && isOnTarget(judged)) return finishTrimmed(judged);
  if (judged.rounds >= state.settings.mostRounds) return finishFailed(judged, 'too-many-rounds');
  return next(judged);
}

/** Takes over a result; a board stuck on or off has its trip point beyond that end of the supply. */
export function withResult(
  state: TrimState,
  result: Extract<SearchResult, { kind: 'found' | 'stuck-on' | 'stuck-off' }>,
): TrimState {
  const { supplyMinVolts, supplyMaxVolts } = state.settings;
  const trip =
    result.kind === 'found'
      ? { volts: result.trip.volts, standardUncertaintyVolts: result.trip.standardUncertaintyVolts }
      : { volts: result.kind === 'stuck-on' ? supplyMinVolts : supplyMaxVolts, standardUncertaintyVolts: 0.3 };
  const hysteresis =
    result.kind === 'found'
      ? { volts: Math.max(0.01, result.release.volts - result.trip.volts), atTripVolts: trip.volts }
      : state.hysteresis;
  return { ...state, trip, hysteresis, tripIsStale: false, liveTripVolts: null };
}

/** The estimate with the trip point just measured, after a turn of unknown size. */
export function relearn(state: TrimState): TrimState {
  const { volts, standardUncertaintyVolts } = state.trip;
  const estimate = observeTrip(turnedFreely(state.estimate), state.settings, volts, standardUncertaintyVolts);
  return { ...state, estimate };
}
