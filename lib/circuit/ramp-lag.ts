import type { Thresholds } from './thresholds';

/** A steady ramp of the supply, and the delays it meets. Seconds, volts a second. */
export interface RampDelays {
  rampVoltsPerSecond: number;
  /** Capacitance at the wiper over G1+G2+Gf. */
  boardSeconds: number;
  /** The filter in the sense line. */
  senseSeconds: number;
  /** From the switching to its detection. */
  detectionSeconds: number;
}

/**
 * Where a ramp finds the points: `actual` at the board when it switches, `sensed` as recorded through the sense line.
 * Board lag and sense lag have opposite signs, and both have opposite signs in trip and release. Valid once the ramp has
 * run for several time constants.
 */
export function pointsOnRamp(points: Thresholds, delays: RampDelays): { actual: Thresholds; sensed: Thresholds } {
  const board = delays.rampVoltsPerSecond * delays.boardSeconds;
  const recorded = delays.rampVoltsPerSecond * (delays.boardSeconds - delays.senseSeconds + delays.detectionSeconds);
  return {
    actual: { tripVolts: points.tripVolts - board, releaseVolts: points.releaseVolts + board },
    sensed: { tripVolts: points.tripVolts - recorded, releaseVolts: points.releaseVolts + recorded },
  };
}
