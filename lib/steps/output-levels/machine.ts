import { readingBudget } from '../../uncertainty/point-budget';
import { reasonFor } from '../../decision/reject-reason';
import { measuring, stay, type Ask, type StepContext, type StepMachine, type StepTurn } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import type { Measurement } from '../../run/types';
import { pathToWithinMaximum, workingVolts } from '../../run/procedures/supply-moves';
import type { OutputLevelsStep } from './schema';

export type OutputLevelsMachine =
  | { stage: 'to-high' | 'to-low'; path: FollowPath; measurements: Measurement[] }
  | { stage: 'supply'; measurements: Measurement[] }
  | { stage: 'high'; supplyVolts: number; measurements: Measurement[] }
  | { stage: 'low'; measurements: Measurement[] };
type Turn = StepTurn<OutputLevelsMachine>;

const read = (channel: 101 | 102): Ask => ({ kind: 'measure', channel, integrationCycles: 1 });

/** The high output, as its drop below the working supply, and the low output at the lowest supply. */
export const machine: StepMachine<OutputLevelsStep, OutputLevelsMachine> = {
  begin: (step, context) => move('to-high', workingVolts(context), [], step, context),

  advance(machine, event, step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'to-high' || machine.stage === 'to-low') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      if ('ask' in turn) return { machine: { ...machine, path: turn.machine }, ask: turn.ask };
      const { measurements } = machine;
      return machine.stage === 'to-high'
        ? { machine: { stage: 'supply', measurements }, ask: read(101) }
        : { machine: { stage: 'low', measurements }, ask: read(102) };
    }
    if (event.kind !== 'measured') return stay(machine);
    switch (machine.stage) {
      case 'supply':
        return { machine: { stage: 'high', supplyVolts: event.volts, measurements: [] }, ask: read(102) };
      case 'high': {
        const high = highMeasurement(machine.supplyVolts, event.volts, context);
        if (!high.passed) return reject(high, []);
        return move('to-low', context.plan.boardType.search.supplyMinVolts, [high], step, context);
      }
      case 'low': {
        const low = lowMeasurement(event.volts, context);
        return low.passed
          ? { done: true, measurements: [...machine.measurements, low] }
          : reject(low, machine.measurements);
      }
    }
  },

  view: () => measuring({ code: 'run.output-levels' }),
};

function move(
  stage: 'to-high' | 'to-low',
  volts: number,
  measurements: Measurement[],
  { settleMs }: OutputLevelsStep,
  context: StepContext,
): Turn {
  const { waypointMs } = context.plan.commissioning;
  const { machine, ask } = beginPath(pathToWithinMaximum(volts, context), { waypointMs, settleMs });
  return { machine: { stage, path: machine, measurements }, ask };
}

function highMeasurement(supplyVolts: number, outputVolts: number, context: StepContext): Measurement {
  const { boardType, meter } = context.plan;
  return judged(
    {
      quantity: 'output-high-drop-volts',
      phase: 'check',
      value: supplyVolts - outputVolts,
      limits: boardType.limits.outputHighDropVolts,
      budget: readingBudget([supplyVolts, outputVolts], meter),
    },
    context,
  );
}

function lowMeasurement(outputVolts: number, context: StepContext): Measurement {
  const { boardType, meter } = context.plan;
  return judged(
    {
      quantity: 'output-low-volts',
      phase: 'check',
      value: outputVolts,
      limits: boardType.limits.outputLowVolts,
      budget: readingBudget([outputVolts], meter),
    },
    context,
  );
}

function reject(failed: Measurement, before: Measurement[]): Turn {
  return {
    ending: { kind: 'reject', cause: null, ...reasonFor(failed) },
    measurements: [...before, failed],
  };
}
