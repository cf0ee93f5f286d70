import type { StationKind } from '../sequence/station-kind';

/** A flip of the output that the typical board shows. */
export interface PredictedFlip {
  atMs: number;
  volts: number;
  point: 'trip' | 'release';
}

/** One step of a draft on one typical board. Times run from the scan; a step that is not reached or not enabled is absent. */
export interface PredictedStep {
  stepId: string;
  fromMs: number;
  toMs: number;
  /** Of that, what the station needs and what a person needs. They add up to the whole. */
  stationMs: number;
  personMs: number;
}

/**
 * A draft played on one typical board (nominal parts, screw off target by the middle of what comes in): the supply as steps, never
 * ramps, when the load was on, and what each step takes.
 */
export interface Prediction {
  steps: PredictedStep[];
  /** Supply from each moment on, until the next. Volts. */
  supply: { atMs: number; volts: number }[];
  loadOn: { fromMs: number; toMs: number }[];
  flips: PredictedFlip[];
  totalMs: number;
  personMs: number;
  /** How the run would end; a reject or a run without verdict names the step. */
  ending: { verdict: 'pass' | 'reject' | 'no-verdict'; reason: string | null; stepId: string | null };
}

/** A station where none is chosen: fast link, controller, no probe. */
export const usualStation: StationKind = {
  hasController: true,
  hasWiperProbe: true,
  baudRate: 115_200,
  commissioning: { overshoot: 0.06, settleMs: 40, waypointMs: 30, noiseVolts: 0.001 },
  meter: { gain: 45e-6 / Math.sqrt(3), offsetVolts: 6e-4 / Math.sqrt(3), resolutionVolts: 1e-4 },
};
