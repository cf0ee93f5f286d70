import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type MeasureChannelMachine } from './machine';
import { rules } from './rules';
import { schema, type MeasureChannelStep } from './schema';
import { sentence } from './sentence';

export const measureChannel: StepKindDefinition<MeasureChannelStep, MeasureChannelMachine> = {
  kind: 'measure-channel',
  word: 'Measure a channel',
  purpose: 'A scanner channel against limits of its own.',
  group: 'check',
  schema,
  fresh: () => ({
    kind: 'measure-channel',
    channel: 102,
    atVolts: null,
    settleMs: 60,
    integrationCycles: 1,
    minVolts: null,
    maxVolts: null,
  }),
  rules,
  needs: ({ channel }) => (channel === 104 ? ['wiper-probe'] : []),
  required: () => checks('channel-volts'),
  machine,
  typicalAct: () => null,
  sentence,
};
