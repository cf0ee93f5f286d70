import type { StepKindDefinition } from '../step-kind';
import { machine } from './machine';
import { rules } from './rules';
import { schema, type RecordStep } from './schema';
import { sentence } from './sentence';

export const record: StepKindDefinition<RecordStep, null> = {
  kind: 'record',
  word: 'Record',
  purpose: 'Supply off, verdict, label or red bin.',
  group: 'record',
  schema,
  fresh: () => ({ kind: 'record' }),
  rules,
  needs: () => [],
  required: () => [],
  machine,
  typicalAct: () => null,
  sentence,
};
