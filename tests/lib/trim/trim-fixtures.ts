import type { BoardDesign } from '../../../lib/circuit/board-design';
import type { FoundPoints, TrimSettings } from '../../../lib/trim/types';
import { pointsAt, wiperFor } from '../../../lib/trim/board-model';

/** A 12 V board: reference 5.6 V with a hard knee, trimmer 10 k over 25 turns, target 10 V. */
export const plainDesign: BoardDesign = {
  reference: { nominalVolts: 5.6, ratedAmps: 0.00044, kneeVolts: 0.01, feedOhms: 10_000 },
  trimmerOhms: 10_000,
  supplyEndOhms: 0,
  groundEndOhms: 0,
  feedbackOhms: 100_000,
  outputDropVolts: 0.7,
  outputLowVolts: 0,
  loadOhms: 1000,
  quiescentAmps: 0.001,
  reservoirFarads: 0.001,
};

export const plainSettings: TrimSettings = {
  procedure: 'two-beeps',
  design: plainDesign,
  trimmer: { turns: 25, clockwise: 'raises', backlashTurns: 5 / 360 },
  targetVolts: 10,
  toleranceVolts: 0.02,
  mostRounds: 8,
  supplyMinVolts: 6,
  supplyMaxVolts: 14,
  overshoot: 0.07,
  noiseVolts: 0.001,
  pollMs: 40,
  fastLink: true,
  referenceVolts: null,
};

/** The points of a board of this design whose screw stands where it trips at `tripVolts`. */
export function pointsOf(design: BoardDesign, tripVolts: number): FoundPoints {
  const { releaseVolts } = pointsAt(design, wiperFor(design, tripVolts));
  return { tripVolts, tripUncertaintyVolts: 0.0008, releaseVolts };
}
