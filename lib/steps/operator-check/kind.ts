import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type OperatorCheckMachine } from './machine';
import { rules } from './rules';
import { schema, type OperatorCheckStep } from './schema';
import { sentence } from './sentence';
import { typicalAct } from './typical-act';

export const operatorCheck: StepKindDefinition<OperatorCheckStep, OperatorCheckMachine> = {
  kind: 'operator-check',
  word: 'Operator check',
  purpose: 'A question that only a person can answer.',
  group: 'check',
  schema,
  fresh: () => ({ kind: 'operator-check', question: 'Is the lamp on the board lit?' }),
  rules,
  needs: () => [],
  required: () => checks('operator-check'),
  machine,
  typicalAct,
  sentence,
};
