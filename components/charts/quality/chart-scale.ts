import { sampleQuantile } from '@/lib/statistics/summary/quantiles';

/** Where the parts of the chart stand, in its own units: one a CSS pixel. */
export interface ChartBox {
  width: number;
  height: number;
  plotLeft: number;
  plotRight: number;
  top: number;
  bottom: number;
  /** The histogram beside the plot, on the same axis. */
  histLeft: number;
  histRight: number;
  narrow: boolean;
}

/** Below this many pixels a chart is drawn as on a phone. */
const narrowBelow = 640;
/** A phone shows the newest boards only. */
export const boardsOnPhone = 80;

export function chartBox(width: number): ChartBox {
  const narrow = width < narrowBelow;
  const plotRight = width - (narrow ? 152 : 310);
  const top = narrow ? 12 : 36;
  const bottom = top + (narrow ? 240 : 250);
  return {
    width,
    narrow,
    plotLeft: 64,
    plotRight,
    top,
    bottom,
    height: bottom + 58,
    histLeft: plotRight + (narrow ? 14 : 18),
    histRight: width - (narrow ? 74 : 92),
  };
}

/** Places in test order that are drawn, from 0, the end left out. */
export interface ShownBoards {
  from: number;
  to: number;
}

/** All boards of the lot with room for those ahead, or the newest ones on a phone. */
export function shownBoards(tested: number, size: number, narrow: boolean): ShownBoards {
  if (!narrow || size <= boardsOnPhone) return { from: 0, to: Math.max(size, tested, 1) };
  const to = Math.max(tested, boardsOnPhone);
  return { from: to - boardsOnPhone, to };
}

/** Middle of a board's share of the axis. */
export function boardX({ plotLeft, plotRight }: ChartBox, { from, to }: ShownBoards): (place: number) => number {
  const pitch = (plotRight - plotLeft) / (to - from);
  return (place) => plotLeft + (place - from + 0.5) * pitch;
}

interface DomainInput {
  values: readonly number[];
  limits: { min: number | null; max: number | null } | null;
  /** Control limits. */
  control: { lower: number; upper: number } | null;
}

/**
 * What the axis shows: the limits with a fifth of the tolerance beyond, and the control limits; without limits, 98 of 100 values.
 * Values beyond are pinned to the edge with their number, so that one wild board does not flatten the rest.
 */
export function shownDomain({ values, limits, control }: DomainInput): [number, number] {
  const marks = [limits?.min, limits?.max, control?.lower, control?.upper].filter((each) => typeof each === 'number');
  const twoSided = limits !== null && limits.min !== null && limits.max !== null;
  const spread = twoSided || values.length === 0 ? [] : [sampleQuantile(values, 0.01), sampleQuantile(values, 0.99)];
  const all = [...marks, ...spread];
  if (all.length === 0) return [0, 1];
  const low = Math.min(...all);
  const high = Math.max(...all);
  const margin = twoSided ? (limits.max! - limits.min!) * 0.2 : (high - low) * 0.1;
  // Equal ends would leave no axis.
  const room = margin > 0 ? margin : Math.abs(high) * 0.1 || 1;
  const from = twoSided ? Math.min(limits.min! - room, low) : low - room;
  const to = twoSided ? Math.max(limits.max! + room, high) : high + room;
  // Turns, seconds and voltages are never negative.
  return [low >= 0 ? Math.max(0, from) : from, to];
}

/** Which edge a value is pinned to; null while it is on the axis. */
export function pinnedTo([low, high]: readonly [number, number], value: number): 'low' | 'high' | null {
  return value < low ? 'low' : value > high ? 'high' : null;
}
