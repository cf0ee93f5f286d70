import type { BoardLimits } from '../../contracts/board-type';
import { hysteresisBudget, mean, pointBudget } from '../../uncertainty/point-budget';
import type { Points } from '../facts';
import type { StepContext } from '../machine';
import { judged, noted } from '../measured';
import type { Measurement } from '../types';

/** One search's trip, release and hysteresis for the record; only verified points are judged. */
export function pointMeasurements(points: Points, phase: 'found' | 'trimmed', context: StepContext): Measurement[] {
  return measure([points], phase, context, noted);
}

/** The mean of the repeats of a verification, judged: the verdict rests on these. */
export function verifiedMeasurements(repeats: Points[], context: StepContext): Measurement[] {
  return measure(repeats, 'verified', context, judged);
}

function measure(
  repeats: Points[],
  phase: Measurement['phase'],
  context: StepContext,
  make: typeof judged,
): Measurement[] {
  const { boardType, meter } = context.plan;
  const settles = repeats.reduce((sum, points) => sum + points.settles, 0);
  return quantities.map(({ quantity, limitsOf, valueOf, uncertaintyOf, budgetOf }) => {
    const values = repeats.map(valueOf);
    const budget = budgetOf({ values, searchUncertainties: repeats.map(uncertaintyOf) }, meter);
    return make({ quantity, phase, value: mean(values), limits: limitsOf(boardType.limits), budget, settles }, context);
  });
}

const quantities: {
  quantity: 'trip-volts' | 'release-volts' | 'hysteresis-volts';
  limitsOf(limits: BoardLimits): { min: number; max: number };
  valueOf(points: Points): number;
  uncertaintyOf(points: Points): number;
  budgetOf: typeof pointBudget;
}[] = [
  {
    quantity: 'trip-volts',
    limitsOf: (limits) => limits.tripVolts,
    valueOf: ({ trip }) => trip.volts,
    uncertaintyOf: ({ trip }) => trip.standardUncertaintyVolts,
    budgetOf: pointBudget,
  },
  {
    quantity: 'release-volts',
    limitsOf: (limits) => limits.releaseVolts,
    valueOf: ({ release }) => release.volts,
    uncertaintyOf: ({ release }) => release.standardUncertaintyVolts,
    budgetOf: pointBudget,
  },
  {
    quantity: 'hysteresis-volts',
    limitsOf: (limits) => limits.hysteresisVolts,
    valueOf: ({ trip, release }) => release.volts - trip.volts,
    uncertaintyOf: ({ trip, release }) => Math.hypot(trip.standardUncertaintyVolts, release.standardUncertaintyVolts),
    budgetOf: hysteresisBudget,
  },
];
