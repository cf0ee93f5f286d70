import { reasonFor } from '@/lib/decision/reject-reason';
import { measuring, stay, type StepMachine } from '@/lib/run/machine';
import { judged } from '@/lib/run/measured';
import type { LoadCurrentStep } from './schema';

export type LoadCurrentMachine = { stage: 'settling' } | { stage: 'reading' };

export const machine: StepMachine<LoadCurrentStep, LoadCurrentMachine> = {
  begin: ({ settleMs }) => ({ machine: { stage: 'settling' }, ask: { kind: 'wait', milliseconds: settleMs } }),

  advance(machine, event, { mostAmps }, context) {
    if (event.kind === 'waited') return { machine: { stage: 'reading' }, ask: { kind: 'measure-supply' } };
    if (event.kind !== 'supply-measured') return stay(machine);
    const measurement = judged(
      { quantity: 'supply-amps', phase: 'check', value: event.amps, limits: { max: mostAmps }, budget: null },
      context,
    );
    return measurement.passed
      ? { done: true, measurements: [measurement] }
      : { ending: { kind: 'reject', cause: null, ...reasonFor(measurement) }, measurements: [measurement] };
  },

  view: () => measuring({ code: 'run.quiescent-current' }),
};
