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

const bell = (z: number, cut: number) => (Math.abs(z) > cut ? 0 : Math.exp(-0.5 * z * z) + priorFloor);

const centre = (grid: Window, i: number) => grid.low + (i + 0.5) * grid.cell;

/** Weight of each trip cell by the level's own range of trip points. */
function tripWeights(settings: SearchSettings, level: Level, grid: Window): Float64Array {
  const weights = new Float64Array(grid.cells).fill(1);
  if (level > 0) return weights;
  const { prior } = settings;
  const half = 0.5 * grid.cell;
  for (let i = 0; i < grid.cells; i++) {
    const volts = centre(grid, i);
    if (prior)
      weights[i] = bell((volts - prior.tripMeanVolts) / Math.hypot(prior.tripSdVolts, 0.3 * grid.cell), tripCut);
    else {
      const inside = Math.min(volts + half, settings.tripMaxVolts) - Math.max(volts - half, settings.tripMinVolts);
      weights[i] = Math.max(0, inside) / grid.cell;
    }
  }
  return weights;
}

function hysteresisBell(prior: SearchPrior, a: Window, b: Window): (hysteresis: number) => number {
  const scale = 1 / Math.hypot(prior.hysteresisSdVolts, 0.3 * a.cell, 0.3 * b.cell);
  return (hysteresis) => bell((hysteresis - prior.hysteresisMeanVolts) * scale, hysteresisCut);
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
    const weigh = hysteresisBell(settings.prior, pair.trip, pair.release);
    for (let i = 0; i < trip.length; i++) {
      let sum = 0;
      const tripVolts = centre(pair.trip, i);
      if (trip[i]! > 0)
        for (let j = 0; j < release.length; j++) {
          if (ownRelease[j]! < 1e-12 && ownTrip[i]! < 1e-12) continue;
          const w = weigh(-centre(pair.release, j) - tripVolts);
          sum += ownRelease[j]! * w;
          release[j]! += ownTrip[i]! * w;
        }
      trip[i]! *= sum;
    }
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

/**
 * How well the level agrees with the outcomes, from posteriors on wide grids. Without a lot prior the share of the mass
 * that the level allows; with one, four tenths of the Bayes factor of the prior against no prior.
 */
export function levelEvidence(
  settings: SearchSettings,
  level: Level,
  pair: Pair<GridPosterior>,
  flat: Pair<GridPosterior>,
): number {
  if (level === 2) return 1;
  const mass = (of: Pair<GridPosterior>) => {
    const weights = coupledWeights(settings, level, of);
    const marginal = cellMarginal(of.trip);
    return marginal.reduce((sum, m, i) => sum + m * weights.trip[i]!, 0);
  };
  if (level === 0 && settings.prior) return (0.4 * mass(pair)) / mass(flat);
  return mass(pair);
}
