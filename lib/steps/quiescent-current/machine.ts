import { newestPoints } from '../../run/facts';
import { reasonFor } from '../../decision/reject-reason';
import { measuring, stay, type StepContext, type StepMachine } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathOffThenUp } from '../../run/procedures/supply-moves';
import type { QuiescentCurrentStep } from './schema';

export type QuiescentMachine = { stage: 'moving'; path: FollowPath } | { stage: 'reading' };

/**
 * The board's own current without its load: with the output held off between the points, as near to the working supply as
 * the latch allows.
 */
export const machine: StepMachine<QuiescentCurrentStep, QuiescentMachine> = {
  begin({ settleMs }, context) {
    const { waypointMs } = context.plan.commissioning;
    const { volts, ceilingVolts } = restingPoint(context);
    const { machine, ask } = beginPath(pathOffThenUp(volts, ceilingVolts, context), { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: machine }, ask };
  },

  advance(machine, event, _step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'moving') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      if ('ask' in turn) return { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask };
      return { machine: { stage: 'reading' }, ask: { kind: 'measure-supply' } };
    }
    if (event.kind !== 'supply-measured') return stay(machine);
    const measurement = judged(
      {
        quantity: 'quiescent-amps',
        phase: 'check',
        value: event.amps,
        limits: context.plan.boardType.limits.quiescentAmps,
        budget: null,
      },
      context,
    );
    const measurements = [measurement];
    return measurement.passed
      ? { done: true, measurements }
      : { ending: { kind: 'reject', cause: null, ...reasonFor(measurement) }, measurements };
  },

  view: () => measuring({ code: 'run.quiescent-current' }),
};

/** Midway between the last points known; their limits stand in where none was measured. */
function restingPoint({ facts, plan }: StepContext): { volts: number; ceilingVolts: number } {
  const points = newestPoints(facts);
  const { tripVolts, releaseVolts } = plan.boardType.limits;
  const trip = points?.trip.volts ?? tripVolts.max;
  const release = points?.release.volts ?? releaseVolts.min;
  return { volts: (trip + release) / 2, ceilingVolts: release - (release - trip) / 4 };
}
