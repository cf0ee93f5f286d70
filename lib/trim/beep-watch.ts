import { pointsAt, wiperFor } from './board-model';
import { designOf } from './board-estimate';
import type { TrimState } from './state';
import { armOffThenHold, armOnThenHold, type SupplyLimits, type SupplyPath } from './supply-path';

/**
 * What the station waits for while the operator turns. Rising: the output is on and goes off when the trip point reaches the
 * held supply. Falling: it is off and comes on when the release point does. All else is mirrored.
 */
export interface BeepWatch {
  beep: 1 | 2;
  rising: boolean;
  holdVolts: number;
  /** Trip point that the hold stands for. */
  tripAtHoldVolts: number;
  /** False where more than four turns are left and the beep comes on the way. */
  last: boolean;
  /** The watched point was proved not to be beyond `near` (toward the hold) nor short of `far`; null where it was not. */
  nearVolts: number | null;
  farVolts: number | null;
  promptedAtMs: number | null;
  nextPeekAtMs: number;
  /** Prompt, or the last movement seen. */
  movedAtMs: number;
  /** Trip point measured before the prompt, null where it is only known to lie within bounds. */
  measuredTripVolts: number | null;
  /** When the finding was shown; the station watches on for the answer. */
  noEffectAtMs: number | null;
  /** The operator answered the finding; the second one is final. */
  screwFound: boolean;
}

/** Hysteresis scales with the divider, so the measured one is scaled as the board's estimate says. Volts. */
export function releaseFor(state: TrimState, tripVolts: number): number {
  const design = designOf(state.estimate.mean, state.settings);
  const nominal = (volts: number) => {
    const points = pointsAt(design, Math.min(0.999, Math.max(0.001, wiperFor(design, volts))));
    return points.releaseVolts - points.tripVolts;
  };
  const { volts, atTripVolts } = state.hysteresis;
  return tripVolts + (volts * nominal(tripVolts)) / nominal(atTripVolts);
}

export function supplyLimits({ settings }: TrimState): SupplyLimits {
  return { minVolts: settings.supplyMinVolts, maxVolts: settings.supplyMaxVolts, overshoot: settings.overshoot };
}

/** Beyond the point by this much, the output surely follows. */
const armMarginVolts = 0.05;

/** Arms the output on the side of the watch and brings the supply to its hold. */
export function armPath(state: TrimState, watch: BeepWatch): SupplyPath {
  const margin = armMarginVolts + 4 * state.settings.noiseVolts;
  const trips = watch.rising ? watch.tripAtHoldVolts : Math.min(watch.tripAtHoldVolts, state.trip.volts);
  if (watch.rising) {
    return armOnThenHold(state.supplyVolts, releaseFor(state, trips) + margin, watch.holdVolts, supplyLimits(state));
  }
  return armOffThenHold(trips - margin, watch.holdVolts, supplyLimits(state));
}

/** Output while the watched point has not reached the hold. */
export const waitingOutput = (watch: BeepWatch) => (watch.rising ? 'on' : 'off');
