import type { BoardDesign, TrimmerTravel } from '../circuit/board-design';
import type { OutputState, SearchPrior, SearchResult } from '../search/types';

/** Telling the operator which way and how far. Pure steppers; volts, turns, milliseconds. */

export type Direction = 'clockwise' | 'anticlockwise';

export interface TrimSettings {
  procedure: 'two-beeps' | 'prompted' | 'wiper-probe';
  design: BoardDesign;
  trimmer: TrimmerTravel;
  targetVolts: number;
  toleranceVolts: number;
  mostRounds: number;
  supplyMinVolts: number;
  supplyMaxVolts: number;
  overshoot: number;
  noiseVolts: number;
  /** Time of one poll of the output's state on this link. */
  pollMs: number;
  /** Whether a live re-measurement is fast enough to count the dial down (about 20 readings a second). */
  fastLink: boolean;
  /** Channel 103 near the trip point, when it was read. */
  referenceVolts: number | null;
  /** Supply at which channel 103 was read; taken as the trip point found when absent. */
  referenceAtVolts?: number | null;
}

/** The board's points as measured before the trim. */
export interface FoundPoints {
  tripVolts: number;
  tripUncertaintyVolts: number;
  releaseVolts: number;
}

/** What the station is to do for the trim. Every command is answered by one observation. */
export type TrimCommand =
  /** Search for both points from here; `check` asks for the end check. Answered by `searched`. */
  | { kind: 'search'; wantedUncertaintyVolts: number; prior: SearchPrior | null; check: boolean }
  /** Move through the waypoints (waypoint dwell), then to `volts`, settle and read the state. The waypoints arm the output and keep every overshoot short of the point. Answered by `held`. */
  | { kind: 'hold'; waypointsVolts: number[]; volts: number }
  /** Read the output's state at the held supply. Answered by `sensed`. */
  | { kind: 'sense' }
  /** Move to `volts`, settle and read the state; the held supply is left. Answered by `probed`. */
  | { kind: 'probe'; volts: number }
  /** Read channels 104 and 101. Answered by `wiper`. */
  | { kind: 'read-wiper' }
  /** Nothing for so long. Answered by `waited`. */
  | { kind: 'wait'; milliseconds: number }
  | { kind: 'finished'; outcome: TrimOutcome };

/** `atMs` is the station's clock when the answer came. */
export type TrimObservation = { atMs: number } & (
  | { kind: 'searched'; result: SearchResult }
  | { kind: 'held'; volts: number; output: OutputState }
  | { kind: 'sensed'; output: OutputState }
  | { kind: 'probed'; volts: number; output: OutputState }
  | { kind: 'wiper'; wiperVolts: number; supplyVolts: number }
  | { kind: 'waited' }
  /** The operator pressed "Will not turn". */
  | { kind: 'will-not-turn' }
  /** The operator answered the finding `no-effect` with "Screw found": the prompt starts again. */
  | { kind: 'screw-found' }
);

/**
 * Findings end prompting; each is told to the operator, and the terminal ones reject the board. `wrong-way` is never
 * terminal; `no-effect` waits once for the operator's choice while watching on, and is terminal at will-not-turn, after a
 * minute, or the second time.
 */
export const trimFindings = [
  'wrong-way',
  'no-effect',
  'end-of-travel',
  'cannot-reach-limits',
  'too-many-rounds',
  'will-not-turn',
  'not-steady',
] as const;
export type TrimFinding = (typeof trimFindings)[number];

export type TrimOutcome = { rounds: number; turnsAdvised: number } & (
  | { kind: 'trimmed'; tripVolts: number; standardUncertaintyVolts: number; releaseVolts: number }
  | { kind: 'failed'; finding: TrimFinding; lastTripVolts: number | null }
);

/** What the screen shows during a trim. */
export interface TrimView {
  stage: 'measuring' | 'beep-1' | 'beep-1-heard' | 'beep-2' | 'beep-2-heard' | 'turn' | 'stop-turning';
  direction: Direction | null;
  /** Exact turns still to make, positive; the dial's end mark. Never more than 4. */
  turns: number | null;
  /** Words for the same, already rounded as the guidance asks. */
  words: TurnWords | null;
  targetVolts: number;
  toleranceVolts: number;
  /** Supply held for the operator, or null while measuring. */
  heldVolts: number | null;
  /** Last measured trip point; stale (hollow) once the screw moved. */
  lastTripVolts: number | null;
  lastTripIsStale: boolean;
  /** Live estimate where one exists (prompted on a fast link, or wiper probe). */
  liveTripVolts: number | null;
  finding: TrimFinding | null;
  /** Measured fact behind the finding, volts moved or seconds without effect. */
  findingVolts: number | null;
  round: number;
  /** The pace the tolerance allows in this stage, in turns a second; null where the operator chooses. */
  paceTurnsPerSecond?: number | null;
}

/** Whole turns and eighths above half a turn; below, degrees. */
export type TurnWords =
  { unit: 'turns'; whole: number; eighths: 0 | 1 | 2 | 3 | 4 | 5 | 6 | 7 } | { unit: 'degrees'; degrees: number };

/*
 * The stepper, in lib/trim/trim.ts (one file a procedure beside it); reach in lib/trim/reach.ts:
 *
 *   beginTrim(settings, found: FoundPoints, atMs): TrimState       immutable to callers, structured-cloneable
 *   nextTrimCommand(state): TrimCommand
 *   observeTrim(state, observation): TrimState
 *   viewTrim(state): TrimView
 *   canTrimReach(settings, found, limits): TrimReach               before the first prompt
 */
