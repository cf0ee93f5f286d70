import type { SequenceFinding } from '../../sequence/finding';
import { settleRules, supplyRules } from '../common-rules';
import type { RuleContext } from '../step-kind';
import type { ReferenceStep } from './schema';

export const rules = (step: ReferenceStep, context: RuleContext): SequenceFinding[] => [
  ...supplyRules(step, 'atVolts', step.atVolts, context),
  ...settleRules(step, context),
];
