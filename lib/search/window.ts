import { type Belief, quantile } from './belief';
import type { Window } from './grid-posterior';

const fewestCells = 16;
const mostCells = 100;

export function windowOver(low: number, high: number, noise: number): Window {
  const wanted = Math.max(0.25e-3, 0.25 * noise);
  const cells = Math.min(mostCells, Math.max(fewestCells, Math.ceil((high - low) / wanted)));
  return { low, cell: (high - low) / cells, cells };
}

/** The window that holds all but a thousandth of the belief at either end, with room for noise. */
export function windowAround(belief: Belief, range: { low: number; high: number }, noise: number): Window {
  const room = 3 * noise + 1e-3 + belief.cell;
  const low = Math.max(range.low, quantile(belief, 0.001) - room);
  const high = Math.min(range.high, quantile(belief, 0.999) + room);
  return windowOver(low, Math.max(high, low + 4e-3), noise);
}

/**
 * The window that suits the belief better, or null when the present one does: extended by its own width where its two
 * edge cells hold over 3 %, shrunk when under six tenths of it are in use.
 */
export function betterWindow(belief: Belief, range: { low: number; high: number }, noise: number): Window | null {
  const { low, cell, cells, marginal } = belief;
  const width = cell * cells;
  const high = low + width;
  const extendDown = marginal[0]! + marginal[1]! > 0.03 && low > range.low + 1e-9;
  const extendUp = marginal[cells - 1]! + marginal[cells - 2]! > 0.03 && high < range.high - 1e-9;
  if (extendDown || extendUp) {
    const from = extendDown ? Math.max(range.low, low - width) : low;
    const to = extendUp ? Math.min(range.high, high + width) : high;
    return windowOver(from, to, noise);
  }
  if (quantile(belief, 0.999) - quantile(belief, 0.001) <= 3e-3) return null;
  const shrunk = windowAround(belief, range, noise);
  return shrunk.cell * shrunk.cells < 0.6 * width ? shrunk : null;
}
