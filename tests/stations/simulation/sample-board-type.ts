import type { BoardType } from '@/lib/contracts/board-type';

/** A 12 V board on a 25-turn trimmer, told by its load current. */
export const sampleBoardType: BoardType = {
  code: 'CB1210',
  name: 'Cutoff board 12 V, 10 A',
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
  limits: {
    tripVolts: { min: 8.95, max: 9.05 },
    releaseVolts: { min: 9.45, max: 9.85 },
    hysteresisVolts: { min: 0.45, max: 0.85 },
    referenceVolts: { min: 4.4, max: 4.9 },
    outputHighDropVolts: { max: 1.6 },
    outputLowVolts: { max: 0.1 },
    quiescentAmps: { max: 0.004 },
    rideThroughSeconds: { min: 0.01 },
  },
  search: {
    supplyMinVolts: 6,
    tripVolts: { min: 8, max: 11 },
    hysteresisVolts: { min: 0.2, max: 1.5 },
    noiseVolts: 0.001,
  },
  absoluteMaximumVolts: 12,
  sensing: { kind: 'load-current', thresholdAmps: 0.005 },
  serialPattern: '^CB1210\\d{4}\\d{5}$',
  mostAttempts: 3,
};
