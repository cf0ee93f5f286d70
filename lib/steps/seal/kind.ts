import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type SealMachine } from './machine';
import { rules } from './rules';
import { schema, type SealStep } from './schema';
import { sentence } from './sentence';
import { typicalAct } from './typical-act';

export const seal: StepKindDefinition<SealStep, SealMachine> = {
  kind: 'seal',
  word: 'Seal',
  purpose: 'Paint or compound on the screw, with the supply off.',
  group: 'seal',
  movesPoints: true,
  schema,
  fresh: () => ({ kind: 'seal' }),
  rules,
  needs: () => [],
  required: () => checks('contact-milliohms'),
  machine,
  typicalAct,
  sentence,
};
