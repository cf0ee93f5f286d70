import { measuring, stay, type StepMachine } from '../../run/machine';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathKeepingOutput } from '../../run/procedures/supply-moves';
import type { ApplyVoltageStep } from './schema';

export type ApplyVoltageMachine = { stage: 'moving'; path: FollowPath } | { stage: 'waiting' };

/** The supply brought to a voltage, and held there. */
export const machine: StepMachine<ApplyVoltageStep, ApplyVoltageMachine> = {
  begin(step, context) {
    const { waypointMs, settleMs } = context.plan.commissioning;
    const path = beginPath(pathKeepingOutput(step.volts, context), { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: path.machine }, ask: path.ask };
  },

  advance(machine, event, { waitMs }) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'waiting') return event.kind === 'waited' ? { done: true } : stay(machine);
    const turn = advancePath(machine.path, event);
    if (!turn) return stay(machine);
    if ('ask' in turn) return { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask };
    return { machine: { stage: 'waiting' }, ask: { kind: 'wait', milliseconds: waitMs } };
  },

  view: (_machine, { volts }) => measuring({ code: 'run.apply-voltage', params: { volts } }),
};
