import type { BoardType } from '@/lib/contracts/board-type';

/** Three invented board types of the demo. Every point follows from the parts by the closed form of lib/circuit. */

/** 12 V, 25-turn trimmer padded to 8.5 to 12.5 V, clockwise raises. Trips at 10.80 V, releases near 12.29 V. */
export const cb1210: BoardType = {
  code: 'CB1210',
  name: 'Undervoltage cutoff, 12 V 10 A',
  design: {
    reference: { nominalVolts: 5.1, ratedAmps: 0.005, kneeVolts: 0.2, feedOhms: 2_200 },
    trimmerOhms: 5_000,
    supplyEndOhms: 12_000,
    groundEndOhms: 10_000,
    feedbackOhms: 105_000,
    outputDropVolts: 1.3,
    outputLowVolts: 0.05,
    loadOhms: 180,
    quiescentAmps: 0.0055,
    reservoirFarads: 0.001,
  },
  trimmer: { turns: 25, clockwise: 'raises', backlashTurns: 0.02 },
  limits: {
    tripVolts: { min: 10.7, max: 10.9 },
    releaseVolts: { min: 12.1, max: 12.5 },
    hysteresisVolts: { min: 1.2, max: 1.7 },
    referenceVolts: { min: 4.8, max: 5.15 },
    outputHighDropVolts: { max: 1.8 },
    outputLowVolts: { max: 0.25 },
    quiescentAmps: { max: 0.009 },
    rideThroughSeconds: { min: 0.01 },
  },
  search: {
    supplyMinVolts: 7,
    tripVolts: { min: 8.1, max: 13 },
    hysteresisVolts: { min: 0.8, max: 2.3 },
    noiseVolts: 0.001,
  },
  absoluteMaximumVolts: 15,
  sensing: { kind: 'output-voltage', thresholdVolts: 2.5 },
  serialPattern: '^CB1210\\d{4}\\d{5}$',
  mostAttempts: 3,
};

/** 24 V, 25-turn trimmer padded to 16.2 to 24.6 V, clockwise lowers, state told by the load current. Trips at 21.60 V. */
export const cb2420: BoardType = {
  code: 'CB2420',
  name: 'Undervoltage cutoff, 24 V 20 A',
  design: {
    reference: { nominalVolts: 6.8, ratedAmps: 0.005, kneeVolts: 0.15, feedOhms: 4_700 },
    trimmerOhms: 5_000,
    supplyEndOhms: 22_000,
    groundEndOhms: 9_100,
    feedbackOhms: 200_000,
    outputDropVolts: 1.4,
    outputLowVolts: 0.05,
    loadOhms: 470,
    quiescentAmps: 0.0065,
    reservoirFarads: 0.00047,
  },
  trimmer: { turns: 25, clockwise: 'lowers', backlashTurns: 0.02 },
  limits: {
    tripVolts: { min: 21.4, max: 21.8 },
    releaseVolts: { min: 23.9, max: 24.65 },
    hysteresisVolts: { min: 2.35, max: 3 },
    referenceVolts: { min: 6.5, max: 6.96 },
    outputHighDropVolts: { max: 1.9 },
    outputLowVolts: { max: 0.25 },
    quiescentAmps: { max: 0.0105 },
    rideThroughSeconds: { min: 0.01 },
  },
  search: {
    supplyMinVolts: 14,
    tripVolts: { min: 15.6, max: 25.4 },
    hysteresisVolts: { min: 1.4, max: 3.7 },
    noiseVolts: 0.001,
  },
  absoluteMaximumVolts: 30,
  sensing: { kind: 'load-current', thresholdAmps: 0.02 },
  serialPattern: '^CB2420\\d{4}\\d{5}$',
  mostAttempts: 3,
};

/** 12 V, single-turn trimmer of 270 degrees padded to 9.8 to 11.8 V, clockwise raises. Trips at 11.00 V. */
export const cb0612: BoardType = {
  code: 'CB0612',
  name: 'Undervoltage cutoff, 12 V 6 A, single-turn',
  design: {
    reference: { nominalVolts: 5.6, ratedAmps: 0.005, kneeVolts: 0.16, feedOhms: 1_500 },
    trimmerOhms: 1_000,
    supplyEndOhms: 4_700,
    groundEndOhms: 4_700,
    feedbackOhms: 56_000,
    outputDropVolts: 1.2,
    outputLowVolts: 0.05,
    loadOhms: 470,
    quiescentAmps: 0.006,
    reservoirFarads: 0.001,
  },
  trimmer: { turns: 0.75, clockwise: 'raises', backlashTurns: 0.008 },
  limits: {
    tripVolts: { min: 10.9, max: 11.1 },
    releaseVolts: { min: 11.75, max: 12.25 },
    hysteresisVolts: { min: 0.85, max: 1.13 },
    referenceVolts: { min: 5.36, max: 5.74 },
    outputHighDropVolts: { max: 1.7 },
    outputLowVolts: { max: 0.25 },
    quiescentAmps: { max: 0.0095 },
    rideThroughSeconds: { min: 0.01 },
  },
  search: {
    supplyMinVolts: 8,
    tripVolts: { min: 9.4, max: 12.2 },
    hysteresisVolts: { min: 0.55, max: 1.5 },
    noiseVolts: 0.001,
  },
  absoluteMaximumVolts: 15,
  sensing: { kind: 'output-voltage', thresholdVolts: 2.5 },
  serialPattern: '^CB0612\\d{4}\\d{5}$',
  mostAttempts: 3,
};

export const boardTypes: BoardType[] = [cb1210, cb2420, cb0612];
