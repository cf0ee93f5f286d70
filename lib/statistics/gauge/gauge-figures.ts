import type { ComponentName } from './variance-components';

export interface GaugeFigure {
  /** In the unit of the readings. */
  deviation: number;
  /** Of the total variance, 0 to 1; they add up. */
  shareOfVariance: number;
  /** Ratio of standard deviations to the total's, 0 to 1; they do not add up. */
  shareOfSpread: number;
  /** Six standard deviations over the width of the tolerance; null without one. */
  shareOfTolerance: number | null;
}

export interface GaugeFigures {
  figures: Record<ComponentName, GaugeFigure>;
  /** sqrt(2) board deviation over gauge deviation; null where the gauge shows no spread at all. */
  distinctRatio: number | null;
  /** The same as a whole number of groups of boards that the gauge can tell apart, at least 1. */
  distinctCategories: number | null;
}

/**
 * What people read off a gauge study: shares of spread and tolerance and the number of distinct categories. `variances` in
 * the square of the readings' unit, `toleranceWidth` in their unit, null for a one-sided limit. AIAG MSA, 4th ed., III B.
 */
export function gaugeFigures(variances: Record<ComponentName, number>, toleranceWidth: number | null): GaugeFigures {
  const figure = (variance: number): GaugeFigure => ({
    deviation: Math.sqrt(variance),
    shareOfVariance: variances.total > 0 ? variance / variances.total : 0,
    shareOfSpread: variances.total > 0 ? Math.sqrt(variance / variances.total) : 0,
    shareOfTolerance: toleranceWidth === null ? null : (6 * Math.sqrt(variance)) / toleranceWidth,
  });
  const ratio = variances.gauge > 0 ? Math.sqrt((2 * variances.board) / variances.gauge) : null;
  return {
    figures: {
      repeatability: figure(variances.repeatability),
      operator: figure(variances.operator),
      interaction: figure(variances.interaction),
      reproducibility: figure(variances.reproducibility),
      gauge: figure(variances.gauge),
      board: figure(variances.board),
      total: figure(variances.total),
    },
    distinctRatio: ratio,
    distinctCategories: ratio === null ? null : Math.max(1, Math.floor(ratio)),
  };
}
