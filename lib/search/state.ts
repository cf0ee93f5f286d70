import type { Level, Pair } from './assumptions';
import type { GridPosterior, Probe } from './grid-posterior';
import type { EndCheck } from './end-check';
import type { OvershootPrior } from './overshoot-range';
import type { SupplyModel } from './supply-level';
import type { OutputState, PointEstimate, SearchCommand, SearchCounts, SearchSettings } from './types';

/** All that is known of one threshold: a coarse posterior over the whole supply range, a fine one, and every probe. */
export interface Side {
  wide: GridPosterior;
  fine: GridPosterior;
  history: readonly Probe[];
}

/** Opaque to callers, never changed in place, and plain data: it survives structured cloning. */
export interface SearchState {
  readonly settings: SearchSettings;
  readonly supply: SupplyModel;
  /** Where the supply is believed to stand. */
  readonly level: number;
  /** The meter's reading after the last command; null before the first. */
  readonly lastReading: number | null;
  readonly output: OutputState;
  readonly sides: Pair<Side>;
  readonly assumptions: Level;
  /** What was believed of the overshoot before any outcome. */
  readonly overshoot: OvershootPrior;
  /** Mass that the first level's assumptions held before any outcome. */
  readonly unseenMass: number;
  readonly counts: SearchCounts;
  /** Settles in which the output stayed off at the highest level allowed, or on at the lowest. */
  readonly settlesAtTop: number;
  readonly settlesAtBottom: number;
  readonly check: EndCheck;
  readonly estimates: Pair<PointEstimate>;
  readonly command: SearchCommand;
}
