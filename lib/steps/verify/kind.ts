import type { StepKindDefinition } from '../step-kind';
import { machine, type VerifyMachine } from './machine';
import { rules } from './rules';
import { schema, type VerifyStep } from './schema';
import { sentence } from './sentence';

export const verify: StepKindDefinition<VerifyStep, VerifyMachine> = {
  kind: 'verify',
  word: 'Verify',
  purpose: 'Trip, release and hysteresis against the limits; the verdict rests on it.',
  group: 'verify',
  schema,
  fresh: () => ({
    kind: 'verify',
    repeats: 3,
    wantedUncertaintyVolts: 0.001,
    mostSettles: 150,
    settleMs: 40,
    mostSpreadVolts: 0.01,
  }),
  rules,
  needs: () => [],
  required: ({ repeats }) => (repeats > 1 ? [{ quantity: 'trip-spread-volts', phase: 'verified' }] : []),
  machine,
  typicalAct: () => null,
  sentence,
};
