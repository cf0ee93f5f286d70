import type { BoardType } from '@/lib/contracts/board-type';
import type { DecisionRule, Sequence, Step } from '@/lib/sequence/step';
import { numberSteps } from '@/lib/sequence/number-steps';
import { cb0612, cb1210, cb2420 } from './board-types';

export interface SeedSequence {
  name: string;
  boardTypeCode: string;
  sequence: Sequence;
}

interface Recipe {
  boardType: BoardType;
  procedure: Extract<Step, { kind: 'trim' }>['procedure'];
  workingVolts: number;
  currentLimitAmps: number;
  targetVolts: number;
  windowMaxVolts: number;
  /** Between the points: an output that drops there stays off and can be seen. */
  rideThroughAtVolts: number;
  decisionRule: DecisionRule;
}

/** All steps of a board, in the order in which the line works. */
function sequenceFor(recipe: Recipe): Sequence {
  const { boardType, procedure, targetVolts, decisionRule } = recipe;
  const searching = { mostSettles: 150, settleMs: 40 };
  return {
    decisionRule,
    steps: numberSteps([
      { kind: 'seat', contactCheck: { volts: 1.8, currentLimitAmps: 0.02, mostMilliohms: 5_000 } },
      {
        kind: 'power-up',
        volts: recipe.workingVolts,
        currentLimitAmps: recipe.currentLimitAmps,
        overvoltageVolts: boardType.absoluteMaximumVolts,
        settleMs: 250,
      },
      { kind: 'reference', atVolts: targetVolts, settleMs: 60 },
      {
        kind: 'find-points',
        windowMinVolts: boardType.search.supplyMinVolts,
        windowMaxVolts: recipe.windowMaxVolts,
        wantedUncertaintyVolts: 0.001,
        ...searching,
      },
      { kind: 'trim', procedure, targetVolts, toleranceVolts: 0.02, mostRounds: 8 },
      { kind: 'seal' },
      { kind: 'verify', repeats: 3, wantedUncertaintyVolts: 0.001, mostSpreadVolts: 0.01, ...searching },
      { kind: 'output-levels', settleMs: 60 },
      { kind: 'quiescent-current', settleMs: 60 },
      { kind: 'ride-through', milliseconds: 10, atVolts: recipe.rideThroughAtVolts },
      { kind: 'operator-check', question: 'Is the green lamp on the board lit?' },
      { kind: 'record' },
    ]),
  };
}

const guardBand: DecisionRule = { kind: 'guard-band', factor: 1 };

/** One released sequence a board type, and one more for fixtures with a probe on the wiper. */
export const sequences: SeedSequence[] = [
  {
    name: 'CB1210 cutoff trim',
    boardTypeCode: cb1210.code,
    sequence: sequenceFor({
      boardType: cb1210,
      procedure: 'two-beeps',
      workingVolts: 13.5,
      currentLimitAmps: 0.3,
      targetVolts: 10.8,
      windowMaxVolts: 14.8,
      rideThroughAtVolts: 12,
      decisionRule: guardBand,
    }),
  },
  {
    name: 'CB2420 cutoff trim',
    boardTypeCode: cb2420.code,
    sequence: sequenceFor({
      boardType: cb2420,
      procedure: 'prompted',
      workingVolts: 26,
      currentLimitAmps: 0.25,
      targetVolts: 21.6,
      windowMaxVolts: 29.5,
      rideThroughAtVolts: 23.7,
      decisionRule: guardBand,
    }),
  },
  {
    name: 'CB0612 cutoff trim',
    boardTypeCode: cb0612.code,
    sequence: sequenceFor({
      boardType: cb0612,
      procedure: 'two-beeps',
      workingVolts: 13.2,
      currentLimitAmps: 0.3,
      targetVolts: 11,
      windowMaxVolts: 14.5,
      rideThroughAtVolts: 11.6,
      decisionRule: { kind: 'simple' },
    }),
  },
  {
    name: 'CB0612 cutoff trim, wiper probe',
    boardTypeCode: cb0612.code,
    sequence: sequenceFor({
      boardType: cb0612,
      procedure: 'wiper-probe',
      workingVolts: 13.2,
      currentLimitAmps: 0.3,
      targetVolts: 11,
      windowMaxVolts: 14.5,
      rideThroughAtVolts: 11.6,
      decisionRule: { kind: 'simple' },
    }),
  },
];
