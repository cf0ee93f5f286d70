import type { SearchPrior, SearchResult } from '../search/types';
import { adviseTo } from './advice';
import { observeTrip, raisingTurnsTo, tripAfter, turnedBy } from './board-estimate';
import { failNoEffect, foundMovement, foundNoEffect, foundWrongWay, noEffectAnswerMs, prompt } from './prompts';
import { finishFailed, nearTarget, type TrimState } from './state';
import type { TrimObservation } from './types';
import { askVerify, judgeVerify, relearn, withResult } from './verify';

/**
 * Prompted on a slow link: the station waits out the turn, takes a glance (a quick search), and verifies. Stopped means
 * that both agree.
 */
export type WaitedPhase =
  | { kind: 'waited'; step: 'wait'; turn: WaitedTurn }
  | { kind: 'waited'; step: 'glance'; turn: WaitedTurn }
  | { kind: 'waited'; step: 'verify'; turn: WaitedTurn; glancedVolts: number };

export interface WaitedTurn {
  fromVolts: number;
  sinceMs: number;
  /** What the wiper should follow, backlash apart; negative lowers the trip point. */
  raisingTurns: number;
  /** Where the estimate expects the trip point after it. */
  expectedVolts: number;
  noEffectAtMs: number | null;
  screwFound: boolean;
}

/** From the screen to the screw, with the tool to fetch or in the hand already. */
const fetchMs = 6000;
const nextMs = 1500;
/** Turning takes longer than its speed says: regrips. */
const regripFactor = 1.4;
const lookAgainMs = 2000;
const noEffectAfterMs = 20_000;
/** A point that never rests is judged all the same. */
const longestPromptMs = 120_000;
/** Two readings of one resting point agree within this, besides their uncertainties. */
const agreeVolts = 0.006;
const glanceUncertaintyVolts = 0.0025;

export function beginWaited(state: TrimState): TrimState {
  const { settings, estimate, pace } = state;
  const raising = raisingTurnsTo(estimate, settings, settings.targetVolts);
  const slack = slackFor(state, raising >= 0);
  const advice = adviseTo(state, settings.targetVolts, slack);
  const followed = Math.max(0, advice.turns - slack) * (advice.raises ? 1 : -1);
  const turn: WaitedTurn = {
    fromVolts: state.trip.volts,
    sinceMs: state.atMs,
    raisingTurns: followed,
    expectedVolts: tripAfter(estimate, settings, followed),
    noEffectAtMs: null,
    screwFound: false,
  };
  const reachMs = state.prompts === 0 ? fetchMs : nextMs;
  const turningMs = (1000 * regripFactor * advice.turns) / pace.briskTurnsPerSecond;
  const prompted = prompt(state, 'turn', advice);
  return prompted.phase.kind === 'over' ? prompted : wait(prompted, turn, reachMs + turningMs + 500);
}

/** Play to take up: all of it on a reversal, half of it where the last turn is not known. */
function slackFor({ settings, lastRaised }: TrimState, raises: boolean): number {
  const { backlashTurns } = settings.trimmer;
  return lastRaised === null ? backlashTurns / 2 : lastRaised === raises ? 0 : backlashTurns;
}

const wait = (state: TrimState, turn: WaitedTurn, milliseconds: number): TrimState => ({
  ...state,
  phase: { kind: 'waited', step: 'wait', turn },
  command: { kind: 'wait', milliseconds: Math.round(milliseconds) },
});

export function observeWaited(state: TrimState, phase: WaitedPhase, seen: TrimObservation): TrimState {
  const { turn } = phase;
  if (seen.kind === 'screw-found') {
    if (turn.noEffectAtMs === null) return state;
    const found = { ...turn, noEffectAtMs: null, screwFound: true, sinceMs: state.atMs };
    return { ...state, finding: null, findingVolts: null, phase: { ...phase, turn: found } };
  }
  if (phase.step === 'wait') return seen.kind === 'waited' ? glance(state, turn) : state;
  if (seen.kind !== 'searched') return state;
  return phase.step === 'glance' ? glanced(state, turn, seen.result) : verified(state, phase, seen.result);
}

const glance = (state: TrimState, turn: WaitedTurn): TrimState => ({
  ...state,
  supplyVolts: null,
  phase: { kind: 'waited', step: 'glance', turn },
  command: {
    kind: 'search',
    wantedUncertaintyVolts: glanceUncertaintyVolts,
    prior: priorAt(state, turn.expectedVolts, 0.03 + 0.05 * Math.abs(turn.expectedVolts - turn.fromVolts)),
    check: false,
  },
});

const priorAt = (state: TrimState, tripMeanVolts: number, tripSdVolts: number): SearchPrior => ({
  ...nearTarget(state),
  tripMeanVolts,
  tripSdVolts,
});

function glanced(state: TrimState, turn: WaitedTurn, result: SearchResult): TrimState {
  const waitedMs = state.atMs - turn.sinceMs;
  if (result.kind === 'unresolved' || result.kind === 'chatter') {
    return waitedMs > longestPromptMs ? finishFailed(state, 'not-steady') : wait(state, turn, lookAgainMs);
  }
  const seen = withResult(state, result);
  const moved = Math.abs(seen.trip.volts - turn.fromVolts);
  const isStill = moved < Math.max(agreeVolts, 4 * seen.trip.standardUncertaintyVolts);
  if (!isStill || isSmall(state, turn)) {
    const moving = turn.noEffectAtMs === null ? seen : foundMovement(seen);
    return verify(moving, { ...turn, noEffectAtMs: null }, seen.trip.volts);
  }
  if (turn.noEffectAtMs !== null) {
    if (state.atMs - turn.noEffectAtMs > noEffectAnswerMs) return failNoEffect(state);
    return wait(state, turn, lookAgainMs);
  }
  if (waitedMs < noEffectAfterMs) return wait(state, turn, lookAgainMs);
  if (turn.screwFound) return failNoEffect(state);
  const told = foundNoEffect(state, Math.round(waitedMs / 1000));
  return wait(told, { ...turn, noEffectAtMs: state.atMs }, lookAgainMs);
}

/** A turn so small that play and the hand's own error may hide it: not moving is no finding then. */
function isSmall({ pace, settings }: TrimState, turn: WaitedTurn): boolean {
  const hidden = 10 / 360 + 2 * settings.trimmer.backlashTurns;
  return Math.abs(turn.raisingTurns) < hidden || Math.abs(turn.expectedVolts - turn.fromVolts) < 2 * pace.peekVolts;
}

function verify(state: TrimState, turn: WaitedTurn, glancedVolts: number): TrimState {
  const stopped: TrimState = {
    ...state,
    stage: 'stop-turning',
    phase: { kind: 'waited', step: 'verify', turn, glancedVolts },
  };
  return askVerify(stopped, priorAt(state, glancedVolts, 0.01));
}

function verified(state: TrimState, phase: Extract<WaitedPhase, { step: 'verify' }>, result: SearchResult): TrimState {
  const { turn, glancedVolts } = phase;
  if (result.kind === 'found' && state.atMs - turn.sinceMs < longestPromptMs) {
    const doubt = 3 * Math.hypot(result.trip.standardUncertaintyVolts, glanceUncertaintyVolts);
    if (Math.abs(result.trip.volts - glancedVolts) > agreeVolts + doubt) {
      return verify(withResult(state, result), turn, result.trip.volts);
    }
  }
  return judgeVerify(state, result, (judged) => nextRound(judged, turn));
}

/** Learns from the turn as far as it was the one asked, and prompts again. */
function nextRound(state: TrimState, turn: WaitedTurn): TrimState {
  const { settings, pace, trip } = state;
  const moved = (trip.volts - turn.fromVolts) * Math.sign(turn.raisingTurns);
  if (moved < -pace.peekVolts) return beginWaited(relearn(foundWrongWay(state, -moved)));
  const asAsked =
    Math.abs(trip.volts - turn.expectedVolts) < 0.25 * Math.abs(turn.expectedVolts - turn.fromVolts) + 0.05;
  if (!asAsked) return beginWaited(relearn(foundMovement(state)));
  const predicted = turnedBy(state.estimate, settings, turn.raisingTurns);
  const estimate = observeTrip(predicted, settings, trip.volts, trip.standardUncertaintyVolts);
  return beginWaited({ ...foundMovement(state), estimate });
}
