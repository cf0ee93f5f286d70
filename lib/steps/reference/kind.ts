import { middleOf } from '../fresh-values';
import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type ReferenceMachine } from './machine';
import { rules } from './rules';
import { schema, type ReferenceStep } from './schema';
import { sentence } from './sentence';

export const reference: StepKindDefinition<ReferenceStep, ReferenceMachine> = {
  kind: 'reference',
  word: 'Reference',
  purpose: 'The reference node against its limits.',
  group: 'seat',
  schema,
  fresh: ({ limits }) => ({ kind: 'reference', atVolts: middleOf(limits.tripVolts), settleMs: 60 }),
  rules,
  needs: () => [],
  required: () => checks('reference-volts'),
  machine,
  typicalAct: () => null,
  sentence,
};
