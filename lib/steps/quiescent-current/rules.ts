import type { SequenceFinding } from '../../sequence/finding';
import { settleRules } from '../common-rules';
import type { RuleContext } from '../step-kind';
import type { QuiescentCurrentStep } from './schema';

export const rules = (step: QuiescentCurrentStep, context: RuleContext): SequenceFinding[] =>
  settleRules(step, context);
