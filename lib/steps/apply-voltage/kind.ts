import { middleOf } from '../fresh-values';
import type { StepKindDefinition } from '../step-kind';
import { machine, type ApplyVoltageMachine } from './machine';
import { rules } from './rules';
import { schema, type ApplyVoltageStep } from './schema';
import { sentence } from './sentence';

export const applyVoltage: StepKindDefinition<ApplyVoltageStep, ApplyVoltageMachine> = {
  kind: 'apply-voltage',
  word: 'Apply a voltage',
  purpose: 'The supply brought to a voltage, and a wait.',
  group: 'check',
  schema,
  fresh: ({ limits }) => ({ kind: 'apply-voltage', volts: middleOf(limits.tripVolts), waitMs: 1_000 }),
  rules,
  needs: () => [],
  required: () => [],
  machine,
  typicalAct: () => null,
  sentence,
};
