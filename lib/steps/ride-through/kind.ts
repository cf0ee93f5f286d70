import { checks } from '../required';
import type { StepKindDefinition } from '../step-kind';
import { machine, type RideThroughMachine } from './machine';
import { rideThroughVolts } from './ride-through-volts';
import { rules } from './rules';
import { schema, type RideThroughStep } from './schema';
import { sentence } from './sentence';

export const rideThrough: StepKindDefinition<RideThroughStep, RideThroughMachine> = {
  kind: 'ride-through',
  word: 'Ride through',
  purpose: 'A short interruption that the output must outlast.',
  group: 'check',
  schema,
  fresh: ({ limits }) => ({
    kind: 'ride-through',
    milliseconds: limits.rideThroughSeconds.min * 1000,
    atVolts: rideThroughVolts(limits),
  }),
  rules,
  needs: () => ['fixture-controller'],
  required: () => checks('ride-through-seconds'),
  machine,
  typicalAct: () => null,
  sentence,
};
