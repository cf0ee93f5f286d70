import type { StepContext } from '../../run/machine';
import type { TypicalAct } from '../step-kind';
import type { InstructionMachine } from './machine';
import type { InstructionStep } from './schema';

/** Common practice, no source. */
const doneMs = 5_000;
const closeLidMs = 1_200;

export function typicalAct(
  machine: InstructionMachine,
  _step: InstructionStep,
  { plan }: StepContext,
): TypicalAct | null {
  if (machine.stage === 'asking') return { act: { kind: 'confirm', what: 'instruction-done' }, afterMs: doneMs };
  if (machine.stage !== 'close-lid') return null;
  const act: TypicalAct['act'] = plan.hasController
    ? { kind: 'lid', closed: true }
    : { kind: 'confirm', what: 'lid-and-board' };
  return { act, afterMs: closeLidMs };
}
