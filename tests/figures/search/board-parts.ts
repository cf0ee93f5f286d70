import type { BoardTruth } from '../../../stations/simulation/board-truth';

/** A sound board around points that are given: only its load and its own current matter to a search. */
export const boardParts: BoardTruth = {
  design: {
    reference: { nominalVolts: 5.1, ratedAmps: 0.005, kneeVolts: 0.2, feedOhms: 10_000 },
    trimmerOhms: 10_000,
    supplyEndOhms: 0,
    groundEndOhms: 0,
    feedbackOhms: 66_000,
    outputDropVolts: 1.3,
    outputLowVolts: 0.02,
    loadOhms: 1200,
    quiescentAmps: 0.0025,
    reservoirFarads: 220e-6,
  },
  trimmer: { turns: 25, clockwise: 'raises', backlashTurns: 0.03 },
  screwTurns: 12,
  stops: { minTurns: 0, maxTurns: 25 },
  noiseVolts: 0,
  wiperJumpVolts: 0,
  wiperFollows: true,
  output: 'works',
  zener: 'works',
  shortOhms: null,
  padOhms: 0,
  defect: 'none',
};
