import { normalCdf } from './normal-distribution';
import type { OvershootPrior } from './overshoot-range';

/**
 * What the outcomes say about one threshold and the overshoot of the moves toward it: probability mass on a grid of
 * threshold cells by overshoot values. Bayesian search with noisy answers after Horstein (1963) and Burnashev and
 * Zigangirov (1974), with the overshoot as a nuisance parameter.
 *
 * Coordinates are those of a fall: the trip point uses volts, the release point minus volts, so that a move toward the
 * threshold always goes down and flips the output when its lowest point is at or below the threshold.
 */
export interface Window {
  low: number;
  cell: number;
  cells: number;
}

export interface GridPosterior extends Window {
  /** Overshoots weighed, fractions of the step. */
  overshoots: readonly number[];
  /** Mass of cell i with overshoot k at [k * cells + i]; sums to 1. */
  mass: Float64Array;
}

/** One move while the threshold was armed: where from, where the supply settled, and whether the output flipped. */
export interface Probe {
  from: number;
  to: number;
  flipped: boolean;
  /** Variance of `to` beyond that of a plain reading, volts squared. */
  extraVariance: number;
}

/** Share of answers that no noise explains; keeps one wrong answer from being final. */
export const lapseRate = 0.005;
/** Spread of the lowest point for the same step, as a fraction of the step. */
const stepScatter = 0.002;

export function flatPosterior(window: Window, overshoot: OvershootPrior): GridPosterior {
  const { cells } = window;
  const mass = new Float64Array(cells * overshoot.values.length);
  overshoot.weights.forEach((weight, k) => mass.fill(weight / cells, k * cells, (k + 1) * cells));
  return { ...window, overshoots: overshoot.values, mass };
}

/** Standard deviation of the answer's edge: comparator noise, step scatter, and the width of a cell. */
export function edgeSd(noise: number, step: number, cell: number, extraVariance: number): number {
  return Math.sqrt(noise * noise + (stepScatter * step) ** 2 + 0.12 * cell * cell + extraVariance);
}

/** Multiplies the probe's likelihood in and normalises, in place. */
function absorbInPlace(posterior: GridPosterior, probe: Probe, noise: number): void {
  const { low, cell, cells, overshoots, mass } = posterior;
  const toward = Math.max(0, probe.from - probe.to);
  const sd = edgeSd(noise, Math.abs(probe.from - probe.to), cell, probe.extraVariance);
  const dt = cell / sd;
  let total = 0;
  for (let k = 0; k < overshoots.length; k++) {
    const lowest = probe.to - overshoots[k]! * toward;
    let t = (low + 0.5 * cell - lowest) / sd;
    for (let i = k * cells, end = i + cells; i < end; i++, t += dt) {
      const flip = lapseRate + (1 - 2 * lapseRate) * normalCdf(t);
      total += mass[i]! *= probe.flipped ? flip : 1 - flip;
    }
  }
  const scale = 1 / total;
  for (let i = 0; i < mass.length; i++) mass[i]! *= scale;
}

export function absorbProbe(posterior: GridPosterior, probe: Probe, noise: number): GridPosterior {
  const next = { ...posterior, mass: posterior.mass.slice() };
  absorbInPlace(next, probe, noise);
  return next;
}

/** The posterior on another window, from the whole history. */
export function rebuildPosterior(
  window: Window,
  history: readonly Probe[],
  noise: number,
  overshoot: OvershootPrior,
): GridPosterior {
  const posterior = flatPosterior(window, overshoot);
  for (const probe of history) absorbInPlace(posterior, probe, noise);
  return posterior;
}
