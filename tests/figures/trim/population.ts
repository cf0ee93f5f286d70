import type { BoardDesign, TrimmerTravel } from '../../../lib/circuit/board-design';
import { softKneeThresholds } from '../../../lib/circuit/soft-knee';
import type { TrimSettings } from '../../../lib/trim/types';
import type { Random } from '../random';
import type { HandHabits } from './hand';
import { TrimmedBoard } from './trimmed-board';

/** The study's board: reference 5.6 V, trimmer 10 k, feedback 100 k, output 0.7 V below the supply; target 10 V. */
const design: BoardDesign = {
  // A knee of 10 mV is the study's ideal reference; 0.44 mA flow at 10 V.
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

export interface TrimType {
  name: '25-turn' | 'single-turn padded' | 'single-turn full' | '25-turn soft knee';
  design: BoardDesign;
  trimmer: TrimmerTravel;
  startMinVolts: number;
  startMaxVolts: number;
  hand: HandHabits;
}

const deg = 1 / 360;
const hand: HandHabits = {
  firstPromptSeconds: 6,
  laterPromptSeconds: 1.5,
  secondBeepSeconds: 0.2,
  reactionSeconds: 0.2,
  briskTurnsPerSecond: 0.5,
  gripTurns: 0.5,
  regripSeconds: 0.3,
  slowestTurnsPerSecond: 2 * deg,
  countErrorFraction: 0.02,
  countErrorTurns: 4 * deg,
  speedSpread: 0.2,
  wrongWayShare: 0,
};

const singleHand: HandHabits = { ...hand, briskTurnsPerSecond: 45 * deg, gripTurns: 90 * deg };

export const trimTypes: Record<'multi' | 'padded' | 'full' | 'soft', TrimType> = {
  multi: {
    name: '25-turn',
    design,
    trimmer: { turns: 25, clockwise: 'raises', backlashTurns: 5 * deg },
    startMinVolts: 8.5,
    startMaxVolts: 11,
    hand,
  },
  padded: {
    name: 'single-turn padded',
    design: { ...design, trimmerOhms: 1200, supplyEndOhms: 3890, groundEndOhms: 4910 },
    trimmer: { turns: 0.75, clockwise: 'raises', backlashTurns: 1 * deg },
    startMinVolts: 9.3,
    startMaxVolts: 10.8,
    hand: singleHand,
  },
  full: {
    name: 'single-turn full',
    design,
    trimmer: { turns: 0.75, clockwise: 'raises', backlashTurns: 1 * deg },
    startMinVolts: 8.5,
    startMaxVolts: 11,
    hand: { ...singleHand, briskTurnsPerSecond: 20 * deg },
  },
  soft: {
    name: '25-turn soft knee',
    design: { ...design, reference: { nominalVolts: 6.1, ratedAmps: 0.005, kneeVolts: 0.2, feedOhms: 10_000 } },
    trimmer: { turns: 25, clockwise: 'raises', backlashTurns: 5 * deg },
    startMinVolts: 8.5,
    startMaxVolts: 11,
    hand,
  },
};

/** A board about its type's design: reference ±5 %, trimmer ±10 %, feedback ±1 % (two standard deviations), drop ±0.1 V. */
export function drawBoard(type: TrimType, random: Random): TrimmedBoard {
  const varied = (value: number, sd: number) => value * (1 + Math.max(-2, Math.min(2, random.normal(0, 1))) * sd);
  const real: BoardDesign = {
    ...type.design,
    reference: { ...type.design.reference, nominalVolts: varied(type.design.reference.nominalVolts, 0.025) },
    trimmerOhms: varied(type.design.trimmerOhms, 0.05),
    feedbackOhms: varied(type.design.feedbackOhms, 0.005),
    outputDropVolts: type.design.outputDropVolts + random.normal(0, 0.05),
  };
  const start = random.uniform(type.startMinVolts, type.startMaxVolts);
  // The screw as it came: bisect for the setting that trips there, the travel's ends included.
  let [low, high] = [0.01, 0.99];
  for (let i = 0; i < 40; i++) {
    const middle = (low + high) / 2;
    const points = softKneeThresholds(real, middle);
    if (points.kind === 'found' && points.tripVolts > start) low = middle;
    else high = middle;
  }
  const board = new TrimmedBoard(real, type.trimmer, (low + high) / 2);
  // Whoever assembled it left the play somewhere.
  board.turn(random.uniform(-1, 1) * type.trimmer.backlashTurns);
  return board;
}

export function settingsFor(
  type: TrimType,
  options: { procedure: TrimSettings['procedure']; toleranceVolts: number; pollMs: number; fastLink: boolean },
): TrimSettings {
  return {
    ...options,
    design: type.design,
    trimmer: type.trimmer,
    targetVolts: 10,
    mostRounds: 8,
    supplyMinVolts: 6,
    supplyMaxVolts: 14,
    overshoot: 0.07,
    noiseVolts: 0.001,
    referenceVolts: null,
  };
}
