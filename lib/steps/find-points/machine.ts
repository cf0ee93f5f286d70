import { noTravel } from '../../run/facts';
import { measuring, stay, type StepMachine } from '../../run/machine';
import {
  advanceLocatePoints,
  beginLocatePoints,
  settlesSoFar,
  type LocatePoints,
} from '../../run/procedures/locate-points';
import { pointMeasurements } from '../../run/procedures/point-measurements';
import type { FindPointsStep } from './schema';

/** Searched for again after a trim, the points are once more those before any trimming. */
const noPointsYet = { found: null, trimmed: null, trimBegan: false, verified: [] };

/** Joint search for trip and release, before any trimming. */
export const machine: StepMachine<FindPointsStep, LocatePoints> = {
  begin(step, context) {
    const { kind: _kind, ...wish } = step;
    const turn = beginLocatePoints({ ...wish, prior: context.plan.prior, endCheck: true }, context);
    return { ...turn, facts: { travel: noTravel, ...noPointsYet } };
  },

  advance(machine, event, _step, context) {
    const turn = 'id' in event ? advanceLocatePoints(machine, event, context) : null;
    if (!turn) return stay(machine);
    if ('ask' in turn) return turn;
    if ('ending' in turn.result) return turn.result;
    const { found } = turn.result;
    return { done: true, facts: { found }, measurements: pointMeasurements(found, 'found', context) };
  },

  view(machine) {
    const settles = settlesSoFar(machine);
    if (settles === null) return measuring({ code: 'run.looking-closer' });
    const again = machine.stage === 'searching' && machine.again;
    return measuring({ code: again ? 'run.find-again' : 'run.find-points' }, settles);
  },
};
