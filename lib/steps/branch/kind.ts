import type { StepKindDefinition } from '../step-kind';
import { machine } from './machine';
import { rules } from './rules';
import { schema, type BranchStep } from './schema';
import { sentence } from './sentence';

export const branch: StepKindDefinition<BranchStep, null> = {
  kind: 'branch',
  word: 'Branch',
  purpose: 'Another step next, on a condition, so often at most.',
  group: 'check',
  schema,
  fresh: ({ limits }) => ({
    kind: 'branch',
    quantity: 'trip-volts',
    is: 'below',
    value: limits.tripVolts.min,
    goTo: '',
    mostTimes: 1,
  }),
  rules,
  needs: () => [],
  required: () => [],
  machine,
  typicalAct: () => null,
  sentence,
};
