import { checks } from '@/lib/steps/required';
import type { StepKindDefinition } from '@/lib/steps/step-kind';
import { machine, type LoadCurrentMachine } from './machine';
import { rules } from './rules';
import { schema, type LoadCurrentStep } from './schema';
import { sentence } from './sentence';

export const loadCurrent: StepKindDefinition<LoadCurrentStep, LoadCurrentMachine> = {
  kind: 'load-current',
  word: 'Load current',
  purpose: 'The current at the standing supply against a limit.',
  group: 'check',
  schema,
  fresh: () => ({ kind: 'load-current', settleMs: 60, mostAmps: 0.12 }),
  rules,
  needs: () => [],
  required: () => checks('supply-amps'),
  machine,
  typicalAct: () => null,
  sentence,
};
