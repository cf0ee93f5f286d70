import type { GridPosterior } from './grid-posterior';

/** A posterior weighted by the assumptions, with what is read off it. Fall coordinates. */
export interface Belief extends GridPosterior {
  /** Mass of each cell over all overshoots. */
  marginal: Float64Array;
  /** Mass below the lower edge of cell i; `cells + 1` values. */
  cumulative: Float64Array;
  mean: number;
  sd: number;
  /** Expected overshoot, and the span of grid indexes that still carries weight. */
  overshootMean: number;
  overshootFrom: number;
  overshootTo: number;
}

/** Mass of each cell over all overshoots. */
export function cellMarginal({ cells, mass, overshoots }: GridPosterior): Float64Array {
  const marginal = new Float64Array(cells);
  for (let k = 0; k < overshoots.length; k++) for (let i = 0; i < cells; i++) marginal[i]! += mass[k * cells + i]!;
  return marginal;
}

export function cumulate(marginal: Float64Array): Float64Array {
  const cumulative = new Float64Array(marginal.length + 1);
  for (let i = 0; i < marginal.length; i++) cumulative[i + 1] = cumulative[i]! + marginal[i]!;
  return cumulative;
}

/** Mass below `x`, linear within a cell. */
export function massBelow(low: number, cell: number, cumulative: Float64Array, x: number): number {
  const position = (x - low) / cell;
  const last = cumulative.length - 1;
  if (position <= 0) return 0;
  if (position >= last) return cumulative[last]!;
  const i = position | 0;
  return cumulative[i]! + (position - i) * (cumulative[i + 1]! - cumulative[i]!);
}

/**
 * Weighs each threshold cell by `weights`. When they exclude everything the posterior holds, the posterior stands as
 * it is: the assumption is then about to be dropped.
 */
export function weighBelief(posterior: GridPosterior, weights: Float64Array): Belief {
  const { low, cell, cells, overshoots } = posterior;
  const given = posterior.mass;
  const mass = new Float64Array(given.length);
  let total = 0;
  for (let k = 0; k < overshoots.length; k++) {
    const first = k * cells;
    for (let i = 0; i < cells; i++) total += mass[first + i] = given[first + i]! * weights[i]!;
  }
  if (!(total > 1e-12)) {
    mass.set(given);
    total = 1;
  }
  const scale = 1 / total;
  const marginal = new Float64Array(cells);
  let overshootMean = 0;
  let overshootFrom = overshoots.length;
  let overshootTo = -1;
  for (let k = 0; k < overshoots.length; k++) {
    const first = k * cells;
    let share = 0;
    for (let i = 0; i < cells; i++) {
      const m = (mass[first + i]! *= scale);
      marginal[i]! += m;
      share += m;
    }
    overshootMean += share * overshoots[k]!;
    if (share > 2e-3) {
      overshootFrom = Math.min(overshootFrom, k);
      overshootTo = k;
    }
  }
  let mean = 0;
  for (let i = 0; i < cells; i++) mean += marginal[i]! * i;
  let variance = 1 / 12;
  for (let i = 0; i < cells; i++) variance += marginal[i]! * (i - mean) ** 2;
  return {
    low,
    cell,
    cells,
    overshoots,
    mass,
    marginal,
    cumulative: cumulate(marginal),
    mean: low + (mean + 0.5) * cell,
    sd: cell * Math.sqrt(variance),
    overshootMean,
    overshootFrom,
    overshootTo,
  };
}

export function quantile({ low, cell, cells, cumulative }: Belief, p: number): number {
  let from = 0;
  let to = cells;
  while (to - from > 1) {
    const middle = (from + to) >> 1;
    if (cumulative[middle]! <= p) from = middle;
    else to = middle;
  }
  const inCell = cumulative[from + 1]! - cumulative[from]!;
  return low + cell * (from + (inCell > 0 ? Math.min(1, Math.max(0, (p - cumulative[from]!) / inCell)) : 0.5));
}
