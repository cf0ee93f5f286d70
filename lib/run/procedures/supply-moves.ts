import { overshootBound } from '../../search/overshoot-range';
import { firstOf } from '../../sequence/enabled-steps';
import { newestPoints } from '../facts';
import type { StepContext } from '../machine';
import { pathWithin } from '../supply-path';

function standing({ facts }: StepContext): number {
  return facts.supply.state === 'on' ? facts.supply.setVolts : 0;
}

/** Anywhere, never past the board's absolute maximum; the output may switch on the way. */
export function pathToWithinMaximum(volts: number, context: StepContext): number[] {
  const from = standing(context);
  const { plan } = context;
  return volts > from
    ? pathUp(from, volts, ceilingVolts(context), context)
    : pathWithin(from, volts, 0, plan.commissioning.overshoot);
}

/** Where the protection would trip, and never above the board's absolute maximum. */
function ceilingVolts({ plan }: StepContext): number {
  const protection = firstOf(plan.sequence, 'power-up')?.overvoltageVolts ?? Infinity;
  return Math.min(plan.boardType.absoluteMaximumVolts, protection);
}

/** Towards a ceiling the largest overshoot considered counts: one that exceeds the commissioned one would do harm. */
function pathUp(from: number, volts: number, ceiling: number, { plan }: StepContext): number[] {
  return pathWithin(from, volts, ceiling, Math.max(overshootBound, plan.commissioning.overshoot));
}

/** The working supply: where the power-up of the sequence brought the board. */
export function workingVolts({ plan }: StepContext): number {
  return firstOf(plan.sequence, 'power-up')?.volts ?? plan.boardType.limits.releaseVolts.max;
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

/**
 * Anywhere within the maximum; where the output is latched and can stay as it is at `volts`, no overshoot switches it on the
 * way. The bound lies midway between the end and the point as last measured, its limit where it was not.
 */
export function pathKeepingOutput(volts: number, context: StepContext): number[] {
  const { facts, plan } = context;
  const { limits } = plan.boardType;
  const from = standing(context);
  const points = newestPoints(facts);
  const trip = points?.trip.volts ?? limits.tripVolts.max;
  const release = points?.release.volts ?? limits.releaseVolts.min;
  const { overshoot } = plan.commissioning;
  if (volts > from) {
    const mayRise = facts.output === 'off' && volts < release ? (volts + release) / 2 : Infinity;
    return pathUp(from, volts, Math.min(mayRise, ceilingVolts(context)), context);
  }
  return pathWithin(from, volts, facts.output === 'on' && volts > trip ? (volts + trip) / 2 : 0, overshoot);
}
