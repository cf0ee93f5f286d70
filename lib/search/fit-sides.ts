import { type Level, type Pair, coupledWeights } from './assumptions';
import { type Belief, weighBelief } from './belief';
import { type Window, rebuildPosterior } from './grid-posterior';
import { allowedLevel } from './level-drop';
import { levelRanges } from './level-ranges';
import type { OvershootPrior } from './overshoot-range';
import type { Side } from './state';
import type { SearchSettings } from './types';
import { betterWindow, windowAround } from './window';

export const pointNames = ['trip', 'release'] as const;
/** Windows move by their own width at most, so a few rounds reach any threshold. */
const mostResizings = 4;

export const gridsOf = (sides: Pair<Side>, which: 'wide' | 'fine') => ({
  trip: sides.trip[which],
  release: sides.release[which],
});

/** The last weighing of each pair of sides: the outcome of a move is looked at with the beliefs that chose it. */
const weighed = new WeakMap<Pair<Side>, { level: Level; beliefs: Pair<Belief> }>();

/** Both fine posteriors under the assumptions of a level, as `weighSides` gives them. */
export function believeSides(settings: SearchSettings, level: Level, sides: Pair<Side>): Pair<Belief> {
  const known = weighed.get(sides);
  if (known?.level === level) return known.beliefs;
  const beliefs = weighSides(settings, level, sides, 'fine');
  weighed.set(sides, { level, beliefs });
  return beliefs;
}

/** Both posteriors under the assumptions of a level. */
function weighSides(settings: SearchSettings, level: Level, sides: Pair<Side>, which: 'wide' | 'fine') {
  const grids = gridsOf(sides, which);
  const weights = coupledWeights(settings, level, grids);
  return { trip: weighBelief(grids.trip, weights.trip), release: weighBelief(grids.release, weights.release) };
}

export interface Fitted {
  sides: Pair<Side>;
  assumptions: Level;
  beliefs: Pair<Belief>;
}

export interface Unfitted extends Omit<Fitted, 'beliefs'> {
  settings: SearchSettings;
  overshoot: OvershootPrior;
  unseenMass: number;
}

/**
 * Fits windows and assumptions to the outcomes. A `lost` threshold's window is placed anew from its wide grid; every
 * changed window is filled from the whole history, so that nothing depends on where the window was before.
 */
export function fitSides(unfitted: Unfitted, lost: Pair<boolean>): Fitted {
  const { settings, overshoot, unseenMass } = unfitted;
  const noise = settings.noiseVolts;
  const refilled = (side: Side, window: Window): Side => ({
    ...side,
    fine: rebuildPosterior(window, side.history, noise, overshoot),
  });
  let { sides, assumptions } = unfitted;
  let placeAnew = lost;
  for (;;) {
    const ranges = levelRanges(settings, assumptions);
    if (placeAnew.trip || placeAnew.release) {
      const wide = weighSides(settings, assumptions, sides, 'wide');
      const placed = { ...sides };
      for (const name of pointNames)
        if (placeAnew[name]) placed[name] = refilled(sides[name], windowAround(wide[name], ranges[name], noise));
      sides = placed;
    }
    let beliefs = believeSides(settings, assumptions, sides);
    for (let i = 0; i < mostResizings; i++) {
      const resized = { ...sides };
      for (const name of pointNames) {
        const window = betterWindow(beliefs[name], ranges[name], noise);
        if (window) resized[name] = refilled(sides[name], window);
      }
      if (resized.trip === sides.trip && resized.release === sides.release) break;
      sides = resized;
      beliefs = believeSides(settings, assumptions, sides);
    }
    const allowed = allowedLevel(settings, assumptions, gridsOf(sides, 'wide'), beliefs, unseenMass);
    if (allowed === assumptions) return { sides, assumptions, beliefs };
    assumptions = allowed;
    placeAnew = { trip: true, release: true };
  }
}
