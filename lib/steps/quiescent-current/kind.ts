import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type QuiescentMachine } from './machine';
import { rules } from './rules';
import { schema, type QuiescentCurrentStep } from './schema';
import { sentence } from './sentence';

export const quiescentCurrent: StepKindDefinition<QuiescentCurrentStep, QuiescentMachine> = {
  kind: 'quiescent-current',
  word: 'Quiescent current',
  purpose: "The board's own current against its limit.",
  group: 'check',
  schema,
  fresh: () => ({ kind: 'quiescent-current', settleMs: 60 }),
  rules,
  needs: () => [],
  required: () => checks('quiescent-amps'),
  machine,
  typicalAct: () => null,
  sentence,
};
