import type { SequenceFinding } from '../../sequence/finding';
import { settleRules } from '../common-rules';
import type { RuleContext } from '../step-kind';
import type { OutputLevelsStep } from './schema';

export const rules = (step: OutputLevelsStep, context: RuleContext): SequenceFinding[] => settleRules(step, context);
