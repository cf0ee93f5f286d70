import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type OutputLevelsMachine } from './machine';
import { rules } from './rules';
import { schema, type OutputLevelsStep } from './schema';
import { sentence } from './sentence';

export const outputLevels: StepKindDefinition<OutputLevelsStep, OutputLevelsMachine> = {
  kind: 'output-levels',
  word: 'Output levels',
  purpose: 'High and low output against their limits.',
  group: 'check',
  schema,
  fresh: () => ({ kind: 'output-levels', settleMs: 60 }),
  rules,
  needs: () => [],
  required: () => checks('output-high-drop-volts', 'output-low-volts'),
  machine,
  typicalAct: () => null,
  sentence,
};
