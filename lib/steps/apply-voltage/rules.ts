import type { SequenceFinding } from '../../sequence/finding';
import { longWaitMs, minutesText, supplyRules } from '../common-rules';
import { failing } from '../failing';
import type { RuleContext } from '../step-kind';
import type { ApplyVoltageStep } from './schema';

export const rules = (step: ApplyVoltageStep, context: RuleContext): SequenceFinding[] => [
  ...supplyRules(step, 'volts', step.volts, context),
  ...failing(step.waitMs > longWaitMs, 'warning', step, {
    problem: 'wait-long',
    field: 'waitMs',
    sentence: `Every board waits ${minutesText(step.waitMs)} here.`,
  }),
];
