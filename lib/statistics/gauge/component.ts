import type { AnovaRow } from './anova-row';
import { differenceInterval, sumInterval, type VarianceInterval } from './mean-square-interval';

export interface Component {
  /** Square of the unit of the readings; never negative. */
  variance: number;
  /** The estimate came out below 0 and was set to 0: no such spread is seen. */
  negative: boolean;
  interval: VarianceInterval | null;
}

/** The residual mean square as a component, with its exact interval. */
export const residualComponent = (row: AnovaRow, confidence: number): Component => ({
  variance: row.meanSquare,
  negative: false,
  interval: sumInterval([{ coefficient: 1, ...row }], confidence),
});

/** A component that is `coefficient` times the difference of two mean squares. */
export function differenceComponent(
  over: AnovaRow,
  under: AnovaRow,
  coefficient: number,
  confidence: number,
): Component {
  const variance = coefficient * (over.meanSquare - under.meanSquare);
  const known = under.meanSquare > 0 && over.meanSquare > 0;
  return {
    variance: Math.max(0, variance),
    negative: variance < 0,
    interval: known ? differenceInterval({ coefficient, ...over }, { coefficient, ...under }, confidence) : null,
  };
}
