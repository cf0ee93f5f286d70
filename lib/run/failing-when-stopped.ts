import type { BoardLimits } from '../contracts/board-type';
import type { Sequence } from '../sequence/step';
import type { Points } from './facts';
import type { RunState } from './state';

/**
 * Whether a run that ends without a verdict had a reading already outside what trimming can correct: a judged value that
 * failed, a verified point outside its limits, a point outside them with no trim to come, or a screw without effect.
 */
export function failingWhenStopped({ facts, plan, stepIndex }: RunState): boolean {
  if (facts.measurements.some((m) => m.passed === false) || facts.trimFailing) return true;
  const { limits } = plan.boardType;
  if (facts.verified.some((points) => isOutside(points, limits))) return true;
  const last = facts.trimmed ?? facts.found;
  return !trimIsAhead(plan.sequence, stepIndex) && last !== null && isOutside(last, limits);
}

/** A branch ahead may lead back to a trim. */
function trimIsAhead({ steps }: Sequence, stepIndex: number): boolean {
  const ahead = steps.filter((step, index) => step.enabled && index >= stepIndex);
  const targets = ahead.flatMap((step) => (step.kind === 'branch' ? [step.goTo] : []));
  const from = Math.min(stepIndex, ...steps.flatMap(({ id }, index) => (targets.includes(id) ? [index] : [])));
  return steps.some((step, index) => step.enabled && step.kind === 'trim' && index >= from);
}

function isOutside({ trip, release }: Points, limits: BoardLimits): boolean {
  const beyond = (value: number, { min, max }: { min: number; max: number }) => value < min || value > max;
  return (
    beyond(trip.volts, limits.tripVolts) ||
    beyond(release.volts, limits.releaseVolts) ||
    beyond(release.volts - trip.volts, limits.hysteresisVolts)
  );
}
