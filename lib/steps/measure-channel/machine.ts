import { reasonFor } from '../../decision/reject-reason';
import { measuring, stay, type StepMachine, type StepTurn } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathKeepingOutput } from '../../run/procedures/supply-moves';
import { readingBudget } from '../../uncertainty/point-budget';
import type { MeasureChannelStep } from './schema';

export type MeasureChannelMachine =
  { stage: 'moving'; path: FollowPath } | { stage: 'settling' } | { stage: 'reading' };

/** A channel against the limits of its step. */
export const machine: StepMachine<MeasureChannelStep, MeasureChannelMachine> = {
  begin(step, context) {
    const { settleMs } = step;
    if (step.atVolts === null) {
      return { machine: { stage: 'settling' }, ask: { kind: 'wait', milliseconds: settleMs } };
    }
    const { waypointMs } = context.plan.commissioning;
    const path = beginPath(pathKeepingOutput(step.atVolts, context), { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: path.machine }, ask: path.ask };
  },

  advance(machine, event, step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'moving') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      return 'ask' in turn ? { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask } : read(step);
    }
    if (machine.stage === 'settling') return event.kind === 'waited' ? read(step) : stay(machine);
    if (event.kind !== 'measured') return stay(machine);
    const measurement = judged(
      {
        quantity: 'channel-volts',
        phase: 'check',
        value: event.volts,
        limits: limitsOf(step),
        budget: readingBudget([event.volts], context.plan.meter),
      },
      context,
    );
    const measurements = [measurement];
    return measurement.passed
      ? { done: true, measurements }
      : { ending: { kind: 'reject', cause: null, ...reasonFor(measurement) }, measurements };
  },

  view: (_machine, { channel }) => measuring({ code: 'run.measure-channel', params: { channel } }),
};

const read = ({ channel, integrationCycles }: MeasureChannelStep): StepTurn<MeasureChannelMachine> => ({
  machine: { stage: 'reading' },
  ask: { kind: 'measure', channel, integrationCycles },
});

const limitsOf = ({ minVolts, maxVolts }: MeasureChannelStep) => ({
  ...(minVolts === null ? {} : { min: minVolts }),
  ...(maxVolts === null ? {} : { max: maxVolts }),
});
