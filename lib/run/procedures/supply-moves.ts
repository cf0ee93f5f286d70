import type { StepContext } from '../machine';
import { pathWithin } from '../supply-path';

function standing({ facts }: StepContext): number {
  return facts.supply.state === 'on' ? facts.supply.setVolts : 0;
}

/** Anywhere, never past the board's absolute maximum; the output may switch on the way. */
export function pathToWithinMaximum(volts: number, context: StepContext): number[] {
  const from = standing(context);
  const { plan } = context;
  const bound = volts > from ? plan.boardType.absoluteMaximumVolts : 0;
  return pathWithin(from, volts, bound, plan.commissioning.overshoot);
}

/** The working supply: where the power-up of the sequence brought the board. */
export function workingVolts({ plan }: StepContext): number {
  const step = plan.sequence.steps.find((s) => s.kind === 'power-up');
  return step?.kind === 'power-up' ? step.volts : plan.boardType.limits.releaseVolts.max;
}

/** On from wherever it stands, then down to `volts` without an undershoot below `floorVolts`. */
export function pathOnThenDown(volts: number, floorVolts: number, context: StepContext): number[] {
  const top = workingVolts(context);
  const { overshoot } = context.plan.commissioning;
  return [...pathToWithinMaximum(top, context), ...pathWithin(top, volts, floorVolts, overshoot)];
}

/** Off at the lowest supply, then up to `volts` without an overshoot above `ceilingVolts`. */
export function pathOffThenUp(volts: number, ceilingVolts: number, context: StepContext): number[] {
  const { search } = context.plan.boardType;
  const { overshoot } = context.plan.commissioning;
  return [
    ...pathToWithinMaximum(search.supplyMinVolts, context),
    ...pathWithin(search.supplyMinVolts, volts, ceilingVolts, overshoot),
  ];
}
