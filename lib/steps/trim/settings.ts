import type { TrimSettings } from '../../trim/types';
import type { StepContext } from '../../run/machine';
import type { TrimStep } from './schema';
import { findStep } from '../../run/procedures/find-step';

export function trimSettings(step: TrimStep, context: StepContext): TrimSettings {
  const { plan, facts } = context;
  const { boardType, commissioning } = plan;
  const { windowMinVolts, windowMaxVolts } = findStep(context);
  return {
    procedure: step.procedure,
    design: boardType.design,
    trimmer: boardType.trimmer,
    targetVolts: step.targetVolts,
    toleranceVolts: step.toleranceVolts,
    mostRounds: step.mostRounds,
    supplyMinVolts: Math.max(boardType.search.supplyMinVolts, windowMinVolts),
    supplyMaxVolts: Math.min(boardType.absoluteMaximumVolts, windowMaxVolts),
    overshoot: commissioning.overshoot,
    noiseVolts: Math.max(boardType.search.noiseVolts, commissioning.noiseVolts),
    pollMs: plan.pollMs,
    fastLink: plan.fastLink,
    referenceVolts: facts.reference?.volts ?? null,
    referenceAtVolts: facts.reference?.supplyVolts ?? null,
  };
}
