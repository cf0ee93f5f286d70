import { measuring, stay, type StepMachine } from '../../run/machine';
import type { RecordStep } from './schema';

/** Supply off with read-back. The verdict is made when it has answered, so that nothing passes before. */
export const machine: StepMachine<RecordStep, null> = {
  begin: () => ({ machine: null, ask: { kind: 'supply-off' } }),
  advance: (machine, event) => (event.kind === 'supply-is-off' ? { ending: { kind: 'complete' } } : stay(machine)),
  view: () => measuring({ code: 'run.switching-off' }),
};
