import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type SoakMachine } from './machine';
import { rules } from './rules';
import { schema, type SoakStep } from './schema';
import { sentence } from './sentence';

export const soak: StepKindDefinition<SoakStep, SoakMachine> = {
  kind: 'soak',
  word: 'Soak',
  purpose: 'A channel read again and again, for drift.',
  group: 'check',
  schema,
  fresh: () => ({
    kind: 'soak',
    channel: 103,
    atVolts: null,
    readings: 20,
    everyMs: 500,
    mostDriftVolts: 0.005,
  }),
  rules,
  needs: ({ channel }) => (channel === 104 ? ['wiper-probe'] : []),
  required: () => checks('drift-volts'),
  machine,
  typicalAct: () => null,
  sentence,
};
