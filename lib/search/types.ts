/** The joint search for trip and release. Volts and milliseconds throughout. Pure: the caller applies, reads and reports back. */

export type OutputState = 'on' | 'off';

export interface SearchPrior {
  tripMeanVolts: number;
  tripSdVolts: number;
  hysteresisMeanVolts: number;
  hysteresisSdVolts: number;
}

export interface SearchSettings {
  /** No command below this. */
  supplyMinVolts: number;
  /** Never exceeded at the terminals, overshoot included. */
  supplyMaxVolts: number;
  tripMinVolts: number;
  tripMaxVolts: number;
  hysteresisMinVolts: number;
  hysteresisMaxVolts: number;
  /** Comparator noise at the supply terminals, one standard deviation. */
  noiseVolts: number;
  wantedUncertaintyVolts: number;
  mostSettles: number;
  /** Overshoot bound measured at commissioning, as a fraction of the step toward the known point. */
  overshoot: number;
  /** The lot's own distribution, once about ten boards are known. */
  prior?: SearchPrior;
  /** Whether the end check is made; always true on a bench. */
  endCheck: boolean;
}

/** What to do next. A waypoint dwells shorter, since only its peak matters. */
export type SearchCommand =
  { kind: 'apply'; volts: number; dwell: 'settle' | 'waypoint' } | { kind: 'finished'; result: SearchResult };

/**
 * What was seen after a command: the meter's reading at the board before and after, and the output's state. `voltsBefore`
 * is a reading taken just before the command, or the last observation's `volts` where none was.
 */
export interface SearchObservation {
  voltsBefore: number;
  volts: number;
  output: OutputState;
}

export interface PointEstimate {
  volts: number;
  standardUncertaintyVolts: number;
}

export interface SearchCounts {
  /** Commands of the search, waypoints included, the end check apart. */
  settles: number;
  waypoints: number;
  endCheckSettles: number;
}

export type SearchResult = SearchCounts &
  (
    | { kind: 'found'; trip: PointEstimate; release: PointEstimate }
    | { kind: 'stuck-on' }
    | { kind: 'stuck-off' }
    /** Release minus trip is within the noise: the output chatters. */
    | { kind: 'chatter'; trip: PointEstimate; release: PointEstimate }
    | { kind: 'unresolved'; trip: PointEstimate | null; release: PointEstimate | null }
  );

/*
 * The stepper, in lib/search/search.ts. SearchState is opaque, immutable to callers and structured-cloneable:
 *
 *   beginSearch(settings: SearchSettings, start: { volts: number; output: OutputState }): SearchState
 *   nextSearchCommand(state: SearchState): SearchCommand        median under 2 ms
 *   observeSearch(state: SearchState, seen: SearchObservation): SearchState
 */
