import { pointsAt, wiperFor } from './board-model';
import type { TrimSettings } from './types';

/** How fast a hand may turn and where the supply waits for it; the study's constants, scaled by the type's volts per turn. */
export interface Pace {
  /** Of the type, at the target. The beeps stand 30 per cent of error in it. */
  voltsPerTurn: number;
  briskTurnsPerSecond: number;
  slowTurnsPerSecond: number;
  /** Beep 1 waits this far below the target while the trip point rises. */
  firstStopVolts: number;
  /** Beep 1 of a falling trip point comes this far below the target. */
  backOffVolts: number;
  /** Beep 2 waits this far below the target: what the point moves until the hand has stopped. */
  leadVolts: number;
  /** Change that a peek takes for a movement. */
  peekVolts: number;
}

/** A person's reaction to the beep, and the settling of hand and screw after it. Study: .2 s and .03 s. */
export const reactionSeconds = 0.2;
const handSettlingSeconds = 0.03;

const deg = 1 / 360;

export function paceOf(settings: TrimSettings): Pace {
  const { trimmer, targetVolts, toleranceVolts, pollMs } = settings;
  const voltsPerTurn = nominalVoltsPerTurn(settings);
  const delaySeconds = reactionSeconds + pollMs / 2000 + handSettlingSeconds;
  const brisk = trimmer.turns >= 2 ? 0.5 : 45 * deg;
  // 69 mV a second at ±20 mV, slower for a tolerance below ±12.5 mV; nobody turns evenly below 2 degrees a second.
  const slowVoltsPerSecond = 0.069 * Math.min(1, toleranceVolts / 0.0125);
  const slow = Math.min(brisk, Math.max(2 * deg, slowVoltsPerSecond / voltsPerTurn));
  const briskOvershootVolts = voltsPerTurn * brisk * delaySeconds;
  return {
    voltsPerTurn,
    briskTurnsPerSecond: brisk,
    slowTurnsPerSecond: slow,
    firstStopVolts: Math.min(0.03 * targetVolts, Math.max(0.15, 1.7 * briskOvershootVolts)),
    backOffVolts: Math.max(0.02, 0.0043 * voltsPerTurn),
    leadVolts: voltsPerTurn * slow * delaySeconds,
    peekVolts: Math.max(0.03, 6 * settings.noiseVolts),
  };
}

function nominalVoltsPerTurn({ design, trimmer, targetVolts }: TrimSettings): number {
  const a = Math.min(0.999, Math.max(0.001, wiperFor(design, targetVolts)));
  const step = 1e-4;
  const at = (wiper: number) => pointsAt(design, wiper).tripVolts;
  return Math.abs(at(a - step) - at(a + step)) / (2 * step * trimmer.turns);
}
