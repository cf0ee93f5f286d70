import { reasonFor } from '../../decision/reject-reason';
import { stay, type StepContext, type StepMachine, type StepTurn } from '../../run/machine';
import { judged } from '../../run/measured';
import { advancePath, beginPath, type FollowPath } from '../../run/procedures/follow-path';
import { pathKeepingOutput } from '../../run/procedures/supply-moves';
import { driftBudget, driftOf, type SoakReading } from './drift';
import type { SoakStep } from './schema';

export type SoakMachine =
  | { stage: 'moving'; path: FollowPath }
  | { stage: 'reading'; sinceMs: number; readings: SoakReading[] }
  | { stage: 'waiting'; sinceMs: number; readings: SoakReading[] };
type Turn = StepTurn<SoakMachine>;

/** A channel read every so often, on a fixed beat; how far a straight line through the readings moves is judged. */
export const machine: StepMachine<SoakStep, SoakMachine> = {
  begin(step, context) {
    if (step.atVolts === null) return read(step, context.atMs, []);
    const { waypointMs, settleMs } = context.plan.commissioning;
    const path = beginPath(pathKeepingOutput(step.atVolts, context), { waypointMs, settleMs });
    return { machine: { stage: 'moving', path: path.machine }, ask: path.ask };
  },

  advance(machine, event, step, context) {
    if (!('id' in event)) return stay(machine);
    if (machine.stage === 'moving') {
      const turn = advancePath(machine.path, event);
      if (!turn) return stay(machine);
      if ('ask' in turn) return { machine: { stage: 'moving', path: turn.machine }, ask: turn.ask };
      return read(step, context.atMs, []);
    }
    const { sinceMs } = machine;
    if (machine.stage === 'waiting') {
      return event.kind === 'waited' ? read(step, sinceMs, machine.readings) : stay(machine);
    }
    if (event.kind !== 'measured') return stay(machine);
    const readings = [...machine.readings, { atMs: event.atMs, volts: event.volts }];
    if (readings.length >= step.readings) return conclude(readings, step, context);
    const leftMs = sinceMs + readings.length * step.everyMs - context.atMs;
    if (leftMs <= 0) return read(step, sinceMs, readings);
    return { machine: { stage: 'waiting', sinceMs, readings }, ask: { kind: 'wait', milliseconds: leftMs } };
  },

  view(machine, { channel, readings, everyMs }) {
    const done = machine.stage === 'moving' ? 0 : machine.readings.length;
    return { kind: 'measuring', what: { code: 'run.soak', params: { channel } }, done, of: readings, everyMs };
  },
};

const read = ({ channel }: SoakStep, sinceMs: number, readings: SoakReading[]): Turn => ({
  machine: { stage: 'reading', sinceMs, readings },
  ask: { kind: 'measure', channel, integrationCycles: 1 },
});

function conclude(readings: SoakReading[], { mostDriftVolts }: SoakStep, context: StepContext): Turn {
  const measurement = judged(
    {
      quantity: 'drift-volts',
      phase: 'check',
      value: Math.abs(driftOf(readings).volts),
      limits: { max: mostDriftVolts },
      budget: driftBudget(readings, context.plan.meter),
    },
    context,
  );
  const measurements = [measurement];
  return measurement.passed
    ? { done: true, measurements }
    : { ending: { kind: 'reject', cause: null, ...reasonFor(measurement) }, measurements };
}
