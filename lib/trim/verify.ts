import type { SearchPrior, SearchResult } from '../search/types';
import { observeTrip, turnedFreely } from './board-estimate';
import { finishFailed, finishTrimmed, provedBy, type TrimState } from './state';

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
  const measured = { ...state, tripIsStale: false, liveTripVolts: null };
  if (result.kind === 'stuck-on') {
    const trip = { volts: supplyMinVolts, standardUncertaintyVolts: 0.3 };
    return { ...measured, trip, proved: { minVolts: null, maxVolts: supplyMinVolts } };
  }
  if (result.kind === 'stuck-off') {
    const trip = { volts: supplyMaxVolts, standardUncertaintyVolts: 0.3 };
    return { ...measured, trip, proved: { minVolts: supplyMaxVolts - state.hysteresis.volts, maxVolts: null } };
  }
  const { volts, standardUncertaintyVolts } = result.trip;
  const trip = { volts, standardUncertaintyVolts };
  const hysteresis = { volts: Math.max(0.01, result.release.volts - volts), atTripVolts: volts };
  return { ...measured, trip, proved: provedBy(trip), hysteresis };
}

/** The estimate with the trip point just measured, after a turn of unknown size. */
export function relearn(state: TrimState): TrimState {
  const { volts, standardUncertaintyVolts } = state.trip;
  const estimate = observeTrip(turnedFreely(state.estimate), state.settings, volts, standardUncertaintyVolts);
  return { ...state, estimate };
}
