import type { LocatePoints } from '../../run/procedures/locate-points';
import type { StepKindDefinition } from '../step-kind';
import { machine } from './machine';
import { rules } from './rules';
import { schema, type FindPointsStep } from './schema';
import { sentence } from './sentence';

export const findPoints: StepKindDefinition<FindPointsStep, LocatePoints> = {
  kind: 'find-points',
  word: 'Find points',
  purpose: 'Trip and release, before any trimming.',
  group: 'find',
  schema,
  fresh: ({ search, absoluteMaximumVolts }) => ({
    kind: 'find-points',
    windowMinVolts: search.supplyMinVolts,
    windowMaxVolts: Math.floor(absoluteMaximumVolts * 9.85) / 10,
    wantedUncertaintyVolts: 0.001,
    mostSettles: 150,
    settleMs: 40,
  }),
  rules,
  needs: () => [],
  required: () => [],
  machine,
  typicalAct: () => null,
  sentence,
};
