import { middleOf } from '../fresh-values';
import type { StepKindDefinition } from '../step-kind';
import { machine, type TrimMachine } from './machine';
import { rules } from './rules';
import { schema, type TrimStep } from './schema';
import { sentence } from './sentence';

export const trim: StepKindDefinition<TrimStep, TrimMachine> = {
  kind: 'trim',
  word: 'Trim',
  purpose: 'Tells the operator which way and how far.',
  group: 'trim',
  movesPoints: true,
  schema,
  fresh: ({ limits }) => ({
    kind: 'trim',
    procedure: 'two-beeps',
    targetVolts: middleOf(limits.tripVolts),
    toleranceVolts: 0.02,
    mostRounds: 8,
  }),
  rules,
  needs: ({ procedure }) => (procedure === 'wiper-probe' ? ['wiper-probe'] : []),
  required: () => [],
  machine,
  typicalAct: () => null,
  sentence,
};
