import type { SearchPrior } from '../../search/types';
import { reasonFor } from '../../decision/reject-reason';
import { noTravel, type Points } from '../../run/facts';
import { causeOfVerified } from '../../run/likely-cause';
import { measuring, stay, type StepContext, type StepMachine, type StepTurn } from '../../run/machine';
import { judged } from '../../run/measured';
import {
  advanceLocatePoints,
  beginLocatePoints,
  settlesSoFar,
  type LocatePoints,
} from '../../run/procedures/locate-points';
import type { Measurement } from '../../run/types';
import { verifiedMeasurements } from '../../run/procedures/point-measurements';
import { findStep } from '../../run/procedures/find-step';
import type { VerifyStep } from './schema';

export interface VerifyMachine {
  done: Points[];
  locate: LocatePoints;
}

/** Trip, release and hysteresis once more, repeated; the mean is judged, and how far the trip points spread. */
export const machine: StepMachine<VerifyStep, VerifyMachine> = {
  begin: (step, context) => repeat(step, context, []),

  advance(machine, event, step, context) {
    const turn = 'id' in event ? advanceLocatePoints(machine.locate, event, context) : null;
    if (!turn) return stay(machine);
    if ('ask' in turn) return { machine: { ...machine, locate: turn.machine }, ask: turn.ask };
    if ('ending' in turn.result) return turn.result;
    const done = [...machine.done, turn.result.found];
    return done.length < step.repeats ? repeat(step, context, done) : conclude(done, step, context);
  },

  view({ done, locate }, { repeats }) {
    const settles = done.reduce((sum, points) => sum + points.settles, settlesSoFar(locate) ?? 0);
    return measuring({ code: 'run.verify', params: { repeat: done.length + 1, repeats } }, settles);
  },
};

function repeat(step: VerifyStep, context: StepContext, done: Points[]): StepTurn<VerifyMachine> {
  const { wantedUncertaintyVolts, mostSettles, settleMs } = step;
  const { windowMinVolts, windowMaxVolts } = findStep(context);
  const prior = priorOf(context, done);
  const turn = beginLocatePoints(
    { windowMinVolts, windowMaxVolts, wantedUncertaintyVolts, mostSettles, settleMs, prior, endCheck: true },
    context,
  );
  return {
    machine: { done, locate: turn.machine },
    ask: turn.ask,
    facts: { verified: done, travel: noTravel },
  };
}

/**
 * What is already known of this board, so wide against the noise that repeats stay independent of each other: sealing may
 * have moved the screw, and the search drops a prior that the board contradicts.
 */
function priorOf({ facts, plan }: StepContext, done: Points[]): SearchPrior | null {
  const last = done.at(-1) ?? facts.trimmed ?? facts.found;
  if (!last) return plan.prior;
  return {
    tripMeanVolts: last.trip.volts,
    tripSdVolts: priorTripSdVolts,
    hysteresisMeanVolts: last.release.volts - last.trip.volts,
    hysteresisSdVolts: priorHysteresisSdVolts,
  };
}
const priorTripSdVolts = 0.03;
const priorHysteresisSdVolts = 0.02;

function conclude(repeats: Points[], step: VerifyStep, context: StepContext): StepTurn<VerifyMachine> {
  const measurements = [...verifiedMeasurements(repeats, context), ...spread(repeats, step, context)];
  const learned = { measurements, facts: { verified: repeats } };
  const failed = measurements.find((m) => m.passed === false);
  if (!failed) return { done: true, ...learned };
  const cause = causeOfVerified(failed, measurements, context.facts.reference, context.plan.boardType);
  return { ending: { kind: 'reject', cause, ...reasonFor(failed) }, ...learned };
}

function spread(repeats: Points[], step: VerifyStep, context: StepContext): Measurement[] {
  if (repeats.length < 2) return [];
  const trips = repeats.map((points) => points.trip.volts);
  const value = Math.max(...trips) - Math.min(...trips);
  const limits = { max: step.mostSpreadVolts };
  return [judged({ quantity: 'trip-spread-volts', phase: 'verified', value, limits, budget: null }, context)];
}
