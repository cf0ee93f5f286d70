import type { SequenceFinding } from '../../sequence/finding';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { InstructionStep } from './schema';

export function rules(step: InstructionStep, { steps, index }: RuleContext): SequenceFinding[] {
  const powered = steps.slice(0, index).some(({ kind }) => kind === 'power-up');
  return failing(powered && !step.supplyOff, 'warning', step, {
    problem: 'instruction-with-supply-on',
    field: 'supplyOff',
    sentence: 'The supply stays on while a person acts at the fixture, with the lid closed.',
    mend: { label: 'Switch it off first', changes: [{ stepId: step.id, field: 'supplyOff', value: true }] },
  });
}
