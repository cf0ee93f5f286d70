import { cellMarginal, cumulate, massBelow } from './belief';
import type { GridPosterior, Window } from './grid-posterior';
import type { SearchPrior, SearchSettings } from './types';

/**
 * What is assumed of the pair beyond the outcomes. Levels, dropped on evidence so that no assumption hides a defective
 * board: 0 the lot's distribution, or the board type's ranges when there is none; 1 the hysteresis range alone, trip
 * anywhere in the supply's range; 2 only that release is not below trip by more than noise.
 */
export type Level = 0 | 1 | 2;

export interface Pair<T> {
  trip: T;
  release: T;
}

const tripCut = 4.5;
const hysteresisCut = 5;
/** Keeps the lot's distribution from ruling out what it merely finds unlikely. */
const priorFloor = 0.02;

/** Release minus trip: the least and most allowed at this level, volts. */
export function hysteresisRange(settings: SearchSettings, level: Level): { min: number; max: number } {
  if (level < 2) return { min: settings.hysteresisMinVolts, max: settings.hysteresisMaxVolts };
  return { min: -3 * settings.noiseVolts - 2e-3, max: Infinity };
}

const bellPerSd = 64;
const bellTable = Float64Array.from({ length: hysteresisCut * bellPerSd + 2 }, (_, i) => {
  const z = i / bellPerSd;
  return Math.exp(-0.5 * z * z) + priorFloor;
});

/** Normal shape with peak 1 on a floor, 0 beyond `cut` standard deviations; from a table, to a hundredth. */
function bell(z: number, cut: number): number {
  const size = Math.abs(z);
  return size > cut ? 0 : bellTable[(size * bellPerSd + 0.5) | 0]!;
}

const centre = (grid: Window, i: number) => grid.low + (i + 0.5) * grid.cell;

/** Weight of each trip cell by the level's own range of trip points. */
function tripWeights(settings: SearchSettings, level: Level, grid: Window): Float64Array {
  const weights = new Float64Array(grid.cells).fill(1);
  if (level > 0) return weights;
  const { prior } = settings;
  const half = 0.5 * grid.cell;
  const sd = prior ? Math.hypot(prior.tripSdVolts, 0.3 * grid.cell) : 0;
  for (let i = 0; i < grid.cells; i++) {
    const volts = centre(grid, i);
    if (prior) weights[i] = bell((volts - prior.tripMeanVolts) / sd, tripCut);
    else {
      const inside = Math.min(volts + half, settings.tripMaxVolts) - Math.max(volts - half, settings.tripMinVolts);
      weights[i] = Math.max(0, inside) / grid.cell;
    }
  }
  return weights;
}

/** Adds the lot's distribution of hysteresis to both sets of weights; only cells within its cut of each other meet. */
function weighByHysteresis(
  prior: SearchPrior,
  grids: Pair<Window>,
  own: Pair<Float64Array>,
  weights: Pair<Float64Array>,
): void {
  const sd = Math.hypot(prior.hysteresisSdVolts, 0.3 * grids.trip.cell, 0.3 * grids.release.cell);
  const step = grids.release.cell / sd;
  const { trip: ownTrip, release: ownRelease } = own;
  const { trip, release } = weights;
  for (let i = 0; i < trip.length; i++) {
    if (trip[i]! === 0) continue;
    // In fall coordinates the release cell at this trip's expected release lies at position `middle`.
    const expected = -(centre(grids.trip, i) + prior.hysteresisMeanVolts);
    const middle = (expected - grids.release.low) / grids.release.cell - 0.5;
    const first = Math.max(0, Math.ceil(middle - hysteresisCut / step));
    const last = Math.min(release.length - 1, Math.floor(middle + hysteresisCut / step));
    const ownOfTrip = ownTrip[i]!;
    let sum = 0;
    for (let j = first; j <= last; j++) {
      const w = bell((j - middle) * step, hysteresisCut);
      sum += ownRelease[j]! * w;
      release[j]! += ownOfTrip * w;
    }
    trip[i]! *= sum;
  }
}

/**
 * Weight of each cell of both thresholds: the trip point's own range, and for each cell the mass of the other threshold
 * at an allowed hysteresis from it. The release grid is in fall coordinates (minus volts).
 */
export function coupledWeights(settings: SearchSettings, level: Level, pair: Pair<GridPosterior>): Pair<Float64Array> {
  const trip = tripWeights(settings, level, pair.trip);
  const release = new Float64Array(pair.release.cells);
  const ownTrip = cellMarginal(pair.trip);
  for (let i = 0; i < ownTrip.length; i++) ownTrip[i]! *= trip[i]!;
  const ownRelease = cellMarginal(pair.release);

  if (level === 0 && settings.prior) {
    weighByHysteresis(settings.prior, pair, { trip: ownTrip, release: ownRelease }, { trip, release });
    return { trip, release };
  }

  const { min, max } = hysteresisRange(settings, level);
  const belowTrip = cumulate(ownTrip);
  const belowRelease = cumulate(ownRelease);
  const tripMass = (x: number) => massBelow(pair.trip.low, pair.trip.cell, belowTrip, x);
  const releaseMass = (x: number) => massBelow(pair.release.low, pair.release.cell, belowRelease, x);
  for (let i = 0; i < trip.length; i++) {
    const volts = centre(pair.trip, i);
    trip[i]! *= releaseMass(-volts - min) - releaseMass(-volts - max);
  }
  for (let j = 0; j < release.length; j++) {
    const volts = -centre(pair.release, j);
    release[j] = tripMass(volts - min) - tripMass(volts - max);
  }
  return { trip, release };
}

/** Mass that the level's assumptions give to a pair of posteriors. */
export function assumedMass(settings: SearchSettings, level: Level, pair: Pair<GridPosterior>): number {
  const weights = coupledWeights(settings, level, pair).trip;
  return cellMarginal(pair.trip).reduce((sum, mass, i) => sum + mass * weights[i]!, 0);
}
