import type { SearchPrior } from '../search/types';
import type { Advice } from './advice';
import { estimateBoard, type BoardEstimate } from './board-estimate';
import { paceOf, type Pace } from './pace';
import type { FollowedPhase } from './followed';
import type { BeepPhase } from './two-beeps';
import type { WaitedPhase } from './waited';
import type { ProbedPhase } from './wiper-probe';
import type { FoundPoints, TrimCommand, TrimFinding, TrimOutcome, TrimSettings, TrimView } from './types';

export interface TripBounds {
  minVolts: number | null;
  maxVolts: number | null;
}

/** Bounds that a measured trip point proves, at three standard uncertainties. */
export function provedBy(trip: { volts: number; standardUncertaintyVolts: number }): TripBounds {
  const doubt = 3 * trip.standardUncertaintyVolts;
  return { minVolts: trip.volts - doubt, maxVolts: trip.volts + doubt };
}

/** One trim from its first prompt to its outcome. Plain data: a copy of it replays the same way. */
export interface TrimState {
  settings: TrimSettings;
  pace: Pace;
  estimate: BoardEstimate;
  phase: { kind: 'start' } | { kind: 'over' } | BeepPhase | FollowedPhase | WaitedPhase | ProbedPhase;
  command: TrimCommand;
  atMs: number;
  stage: TrimView['stage'];
  advice: Advice | null;
  /** The trip point as last measured, or as the last beep or bracket tells. */
  trip: { volts: number; standardUncertaintyVolts: number };
  /** What is proved of the trip point where the screw last stood; null where nothing is. */
  proved: TripBounds;
  /** Hysteresis as last measured, and the trip point it belongs to. */
  hysteresis: { volts: number; atTripVolts: number };
  tripIsStale: boolean;
  heldVolts: number | null;
  liveTripVolts: number | null;
  /** Where the last command left the supply; null after a search. */
  supplyVolts: number | null;
  finding: TrimFinding | null;
  findingVolts: number | null;
  /** Verifying searches made. */
  rounds: number;
  /** Times the operator was asked to turn; bounded, so that prompting ends. */
  prompts: number;
  turnsAdvised: number;
  /** Whether the last prompt was to raise the trip point; null before the first. */
  lastRaised: boolean | null;
  /** Turned the wrong way since the trip point last moved as asked. */
  wrongWays: number;
  /** The screw works against the type's direction. */
  reversed: boolean;
  /** The verifying search was unresolved and is repeated without assumptions. */
  searchRepeated: boolean;
}

export function startState(settings: TrimSettings, found: FoundPoints, atMs: number): TrimState {
  const trip = { volts: found.tripVolts, standardUncertaintyVolts: found.tripUncertaintyVolts };
  return {
    settings,
    pace: paceOf(settings),
    estimate: estimateBoard(settings, found),
    phase: { kind: 'start' },
    command: { kind: 'wait', milliseconds: 0 },
    atMs,
    stage: 'measuring',
    advice: null,
    trip,
    proved: provedBy(trip),
    hysteresis: { volts: found.releaseVolts - found.tripVolts, atTripVolts: found.tripVolts },
    tripIsStale: false,
    heldVolts: null,
    liveTripVolts: null,
    supplyVolts: null,
    finding: null,
    findingVolts: null,
    rounds: 0,
    prompts: 0,
    turnsAdvised: 0,
    lastRaised: null,
    wrongWays: 0,
    reversed: false,
    searchRepeated: false,
  };
}

export function finishTrimmed(state: TrimState): TrimState {
  const { volts, standardUncertaintyVolts } = state.trip;
  return finish(state, {
    kind: 'trimmed',
    tripVolts: volts,
    standardUncertaintyVolts,
    releaseVolts: volts + state.hysteresis.volts,
    rounds: state.rounds,
    turnsAdvised: state.turnsAdvised,
  });
}

export function finishFailed(state: TrimState, finding: TrimFinding): TrimState {
  const { rounds, turnsAdvised, trip } = state;
  return finish({ ...state, finding }, { kind: 'failed', finding, lastTripVolts: trip.volts, rounds, turnsAdvised });
}

function finish(state: TrimState, outcome: TrimOutcome): TrimState {
  return {
    ...state,
    phase: { kind: 'over' },
    stage: 'measuring',
    advice: null,
    command: { kind: 'finished', outcome },
  };
}

/** Where the trim's own searches look first: near the target, hysteresis as measured. */
export function nearTarget(state: TrimState): SearchPrior {
  return {
    tripMeanVolts: state.settings.targetVolts,
    tripSdVolts: 0.03,
    hysteresisMeanVolts: state.hysteresis.volts,
    hysteresisSdVolts: 0.02,
  };
}
