import type { TrimState } from './state';
import type { TrimView } from './types';

/** What the screen shows during a trim. */
export function viewTrim(state: TrimState): TrimView {
  const { settings, advice, pace, stage } = state;
  const turning = stage === 'beep-1' || stage === 'beep-2' || stage === 'turn';
  return {
    stage,
    direction: turning ? (advice?.direction ?? null) : null,
    turns: turning ? (advice?.turns ?? null) : null,
    words: turning ? (advice?.words ?? null) : null,
    targetVolts: settings.targetVolts,
    toleranceVolts: settings.toleranceVolts,
    heldVolts: state.heldVolts,
    lastTripVolts: state.trip.volts,
    lastTripIsStale: state.tripIsStale,
    liveTripVolts: state.liveTripVolts,
    finding: state.finding,
    findingVolts: state.findingVolts,
    round: Math.min(state.rounds + 1, settings.mostRounds),
    paceTurnsPerSecond: stage === 'beep-2' ? pace.slowTurnsPerSecond : null,
  };
}
