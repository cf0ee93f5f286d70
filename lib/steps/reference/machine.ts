import { readingBudget } from '../../uncertainty/point-budget';
import { reasonFor } from '../../decision/reject-reason';
import { causeOfReference } from '../../run/likely-cause';
import { measuring, stay, type StepMachine } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathToWithinMaximum } from '../../run/procedures/supply-moves';
import type { ReferenceStep } from './schema';

export type ReferenceMachine = { stage: 'moving'; path: FollowPath } | { stage: 'reading'; supplyVolts: number };

/** The reference node near the supply voltage given, against the reference limits of the board type. */
export const machine: StepMachine<ReferenceStep, ReferenceMachine> = {
  begin(step, context) {
    const { waypointMs } = context.plan.commissioning;
    const path = beginPath(pathToWithinMaximum(step.atVolts, context), { waypointMs, settleMs: step.settleMs });
    return { machine: { stage: 'moving', path: path.machine }, ask: path.ask };
  },

  advance(machine, event, _step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'moving') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      if ('ask' in turn) return { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask };
      return {
        machine: { stage: 'reading', supplyVolts: turn.result.volts },
        ask: { kind: 'measure', channel: 103, integrationCycles: 1 },
      };
    }
    if (event.kind !== 'measured') return stay(machine);
    const { boardType, meter } = context.plan;
    const measurement = judged(
      {
        quantity: 'reference-volts',
        phase: 'check',
        value: event.volts,
        limits: boardType.limits.referenceVolts,
        budget: readingBudget([event.volts], meter),
      },
      context,
    );
    const learned = {
      measurements: [measurement],
      facts: { reference: { volts: event.volts, supplyVolts: machine.supplyVolts } },
    };
    if (measurement.passed) return { done: true, ...learned };
    const cause = causeOfReference(event.volts, machine.supplyVolts, boardType.design);
    return { ending: { kind: 'reject', cause, ...reasonFor(measurement) }, ...learned };
  },

  view: () => measuring({ code: 'run.reference' }),
};
