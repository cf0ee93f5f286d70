import { measuring, stay, type StepMachine } from '../../run/machine';
import type { BranchStep } from './schema';

/** Decides at once. A value that was never measured leads nowhere else. */
export const machine: StepMachine<BranchStep, null> = {
  begin({ id, quantity, is, value, goTo, mostTimes }, { facts }) {
    const newest = facts.measurements.findLast((m) => m.quantity === quantity)?.value ?? NaN;
    const taken = facts.branchesTaken[id] ?? 0;
    const holds = is === 'below' ? newest < value : newest > value;
    if (!holds || taken >= mostTimes) return { done: true };
    return { done: true, goTo, facts: { branchesTaken: { ...facts.branchesTaken, [id]: taken + 1 } } };
  },
  advance: (machine) => stay(machine),
  view: () => measuring({ code: 'run.looking-closer' }),
};
