import type { StepContext } from '../../run/machine';
import type { TypicalAct } from '../step-kind';
import type { SeatMachine } from './machine';
import type { SeatStep } from './schema';

/** Common practice, no source. */
const placeMs = 3_500;
const closeLidMs = 1_200;

export function typicalAct(machine: SeatMachine, _step: SeatStep, { plan, facts }: StepContext): TypicalAct | null {
  if (machine.stage !== 'waiting') return null;
  if (!plan.hasController) {
    return { act: { kind: 'confirm', what: 'lid-and-board' }, afterMs: placeMs + closeLidMs };
  }
  return facts.boardPresent
    ? { act: { kind: 'lid', closed: true }, afterMs: closeLidMs }
    : { act: { kind: 'board', present: true }, afterMs: placeMs };
}
