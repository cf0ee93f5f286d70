import { firstOf } from '../sequence/enabled-steps';
import type { Step } from '../sequence/step';
import { combineContributions } from '../uncertainty/combine';
import { pointBudget, type MeterUncertainty } from '../uncertainty/point-budget';

/** U of a point near `volts` when verified as the sequence asks, where the repeats agree as well as each search does. Volts. */
export function expectedUncertaintyAt(volts: number, sequence: { steps: readonly Step[] }, meter: MeterUncertainty) {
  const step = firstOf(sequence, 'verify');
  const [repeats, search] = step ? [step.repeats, step.wantedUncertaintyVolts] : [1, 0.001];
  const point = { values: [volts], searchUncertainties: [search / Math.sqrt(repeats)] };
  return combineContributions(pointBudget(point, meter)).expanded;
}
