import type { FindPointsStep } from '../../steps/find-points/schema';
import type { StepCommon } from '../../steps/step-common';
import { firstOf } from '../../sequence/enabled-steps';
import type { StepContext } from '../machine';

type FindStep = Omit<FindPointsStep, keyof StepCommon>;

/** How this sequence looks for the points; a sequence that only verifies looks over the board type's whole range. */
export function findStep({ plan }: StepContext): FindStep {
  const step = firstOf(plan.sequence, 'find-points');
  if (step) return step;
  const { search, absoluteMaximumVolts } = plan.boardType;
  return {
    kind: 'find-points',
    windowMinVolts: search.supplyMinVolts,
    windowMaxVolts: absoluteMaximumVolts,
    wantedUncertaintyVolts: 0.001,
    mostSettles: 150,
    settleMs: plan.commissioning.settleMs,
  };
}
