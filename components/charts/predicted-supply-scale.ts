import { scaleLinear } from 'd3-scale';
import type { Prediction } from '@/lib/prediction/types';

export interface PointLimits {
  tripVolts: { min: number; max: number };
  releaseVolts: { min: number; max: number };
}

export const height = 252;
const top = 26;
const bottom = height - 62;
/** Everything below the points is squeezed into this, behind the break in the axis. */
const squeezed = 22;

/**
 * Volts to pixels: the range of the points and what lies above in full, the rest down to zero behind a break. `breakVolts`
 * is 0 where nothing is squeezed.
 */
export function voltScale({ tripVolts, releaseVolts }: PointLimits, predictions: readonly Prediction[]) {
  const most = Math.max(releaseVolts.max, ...predictions.flatMap(({ supply }) => supply.map(({ volts }) => volts)));
  const below = tripVolts.min - 0.9 * (releaseVolts.max - tripVolts.min);
  const breakVolts = Math.max(0, Math.floor(below * 2) / 2);
  const highVolts = Math.ceil(most * 2) / 2;
  const y = scaleLinear([0, breakVolts, highVolts], [bottom, bottom - squeezed, top]);
  const whole = breakVolts === 0 ? scaleLinear([0, highVolts], [bottom, top]) : y;
  const ticks = scaleLinear([breakVolts, highVolts], [0, 1]).ticks(6);
  return { y: (volts: number) => whole(volts)!, ticks, breakVolts, top, bottom };
}

/** The supply as it is set: level until the next command, then straight up or down. */
export function stepPath(
  { supply, totalMs }: Prediction,
  x: (ms: number) => number,
  y: (volts: number) => number,
): string {
  const [first, ...rest] = supply;
  if (!first) return '';
  const moves = rest.map(({ atMs, volts }) => `H${x(atMs).toFixed(1)}V${y(volts).toFixed(1)}`);
  return `M${x(first.atMs).toFixed(1)} ${y(first.volts).toFixed(1)}${moves.join('')}H${x(totalMs).toFixed(1)}`;
}
