import type { ChartLimits } from './limits';

export interface EwmaSettings {
  /** Weight of the newest value, over 0 to 1. */
  lambda: number;
  /** Frozen centre and standard deviation of single values, in their unit. */
  target: number;
  sigma: number;
  /** Width of the limits in standard deviations of the average. */
  width: number;
}

/**
 * Exponentially weighted moving average, begun at the target, with the limits at every point (narrower for the first ones).
 * Finds small drifts sooner than single values do. NIST/SEMATECH e-Handbook 6.3.2.4; Lucas and Saccucci, Technometrics 32 (1990).
 */
export function ewmaChart(
  values: readonly number[],
  { lambda, target, sigma, width }: EwmaSettings,
): { averages: number[]; limits: ChartLimits[]; steady: ChartLimits } {
  let average = target;
  const averages = values.map((value) => (average = lambda * value + (1 - lambda) * average));
  const limitsAt = (share: number): ChartLimits => {
    const reach = width * sigma * Math.sqrt((lambda / (2 - lambda)) * share);
    return { centre: target, lower: target - reach, upper: target + reach };
  };
  return {
    averages,
    limits: values.map((_, i) => limitsAt(1 - (1 - lambda) ** (2 * (i + 1)))),
    steady: limitsAt(1),
  };
}
