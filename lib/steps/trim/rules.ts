import type { SequenceFinding } from '../../sequence/finding';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { TrimStep } from './schema';

export function rules(step: TrimStep, { boardType }: RuleContext): SequenceFinding[] {
  const { tripVolts } = boardType.limits;
  const outside =
    step.targetVolts - step.toleranceVolts < tripVolts.min || step.targetVolts + step.toleranceVolts > tripVolts.max;
  return failing(outside, 'error', step, {
    problem: 'target-outside-limits',
    field: 'targetVolts',
    sentence: 'The target lies outside the limits.',
  });
}
