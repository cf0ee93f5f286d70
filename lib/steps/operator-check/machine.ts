import { reasonFor } from '../../decision/reject-reason';
import { measuring, stay, type StepMachine } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathToWithinMaximum, workingVolts } from '../../run/procedures/supply-moves';
import type { OperatorCheckStep } from './schema';

export type OperatorCheckMachine = { stage: 'moving'; path: FollowPath } | { stage: 'asking' };

/** A question that only a person can answer, asked with the output on at the working supply. */
export const machine: StepMachine<OperatorCheckStep, OperatorCheckMachine> = {
  begin(_step, context) {
    const { waypointMs, settleMs } = context.plan.commissioning;
    const path = pathToWithinMaximum(workingVolts(context), context);
    const { machine, ask } = beginPath(path, { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: machine }, ask };
  },

  advance(machine, event, _step, context) {
    if (machine.stage === 'moving') {
      const turn = 'id' in event ? advancePath(machine.path, event) : null;
      if (!turn) return stay(machine);
      return 'ask' in turn
        ? { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask }
        : stay({ stage: 'asking' });
    }
    if (event.kind !== 'answer') return stay(machine);
    const measurement = judged(
      { quantity: 'operator-check', phase: 'check', value: event.ok ? 1 : 0, limits: { min: 1 }, budget: null },
      context,
    );
    const measurements = [measurement];
    return event.ok
      ? { done: true, measurements }
      : {
          ending: { kind: 'reject', cause: null, reason: reasonFor(measurement).reason, measured: null },
          measurements,
        };
  },

  view: (machine, step) =>
    machine.stage === 'asking'
      ? { kind: 'operator-check', question: step.question }
      : measuring({ code: 'run.operator-check' }),
};
