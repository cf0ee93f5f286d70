import type { OutputState } from '../search/types';
import { adviseTurns } from './advice';
import { firstPlace, judgePeek, lookAt, type PeekFinding, type PeekPlace } from './beep-peek';
import { armPath, releaseFor, waitingOutput, type BeepWatch } from './beep-watch';
import { raisingTurnsTo, tripAfter } from './board-estimate';
import { reactionSeconds } from './pace';
import { failNoEffect, foundMovement, foundNoEffect, foundWrongWay, noEffectAnswerMs, prompt } from './prompts';
import { finishFailed, nearTarget, provedBy, type TrimState } from './state';
import type { TrimObservation } from './types';
import { askVerify, judgeVerify, relearn, withResult } from './verify';

/**
 * Two beeps: the supply waits short of the target and the operator turns until the board itself answers, first briskly,
 * then slowly. Needs no counting of turns, no button and no fast link.
 *
 * arm (waypoints to the hold) → turn (sense until the output changes, peeks in between) → heard (pause) → arm … → verify.
 * `measure` searches again where nothing was heard for long.
 */
export type BeepPhase =
  | { kind: 'beeps'; step: 'arm' | 'turn' | 'heard' | 'measure'; watch: BeepWatch }
  | { kind: 'beeps'; step: 'peek'; watch: BeepWatch; place: PeekPlace }
  | { kind: 'beeps'; step: 'verify' };

const pauseAfterBeepMs = 1200;
const handsOffMs = 500;
/** Without movement: the tool is on the screw already, or it has to be fetched (first prompt, screw just found). */
const noEffectAfterMs = 6000;
const noEffectWithFetchAfterMs = 12_000;
/** Silence after a movement, or with the point too near the hold to peek, before the station measures again. */
const silenceMs = 10_000;
/** A trip point found within this of the target is turned back first, so that the last turn always rises. */
const turnBackVolts = 0.03;

export function beginTwoBeeps(state: TrimState): TrimState {
  return chooseBeep(state, turnBackVolts);
}

function chooseBeep(state: TrimState, shortVolts: number): TrimState {
  const { settings, pace, trip } = state;
  if (trip.volts < settings.targetVolts - pace.firstStopVolts - 0.03) return riseToFirst(state);
  if (trip.volts > settings.targetVolts - shortVolts) return fall(state, pace.backOffVolts);
  return riseToSecond(state);
}

/** After a verified stop a point short of the second hold rises straight to it. */
const chooseAgain = (state: TrimState) => chooseBeep(relearn(state), state.pace.leadVolts + 0.004);

const riseToFirst = (state: TrimState) =>
  watchFor(state, 1, true, state.settings.targetVolts - state.pace.firstStopVolts);
const riseToSecond = (state: TrimState) => watchFor(state, 2, true, state.settings.targetVolts - state.pace.leadVolts);
const fall = (state: TrimState, belowVolts: number) =>
  watchFor(state, 1, false, state.settings.targetVolts - belowVolts);

/** Watches for the trip point to reach `tripVolts`, or as far toward it as four turns go, and arms for it. */
function watchFor(state: TrimState, beep: 1 | 2, rising: boolean, tripVolts: number): TrimState {
  const needed = raisingTurnsTo(state.estimate, state.settings, beep === 2 ? state.settings.targetVolts : tripVolts);
  const advice = adviseTurns(state, rising ? Math.max(0.01, needed) : Math.min(-0.01, needed));
  const last = advice.cutBy !== 'most-at-once';
  const signed = rising ? advice.turns : -advice.turns;
  const tripAtHoldVolts = last ? tripVolts : tripAfter(state.estimate, state.settings, signed);
  const pointAt = (trip: number | null) => (trip === null || rising ? trip : releaseFor(state, trip));
  const { minVolts, maxVolts } = state.proved;
  return arm(
    { ...state, advice },
    {
      beep,
      rising,
      last,
      holdVolts: rising ? tripAtHoldVolts : releaseFor(state, tripAtHoldVolts),
      tripAtHoldVolts,
      nearVolts: pointAt(rising ? maxVolts : minVolts),
      farVolts: pointAt(rising ? minVolts : maxVolts),
      promptedAtMs: null,
      nextPeekAtMs: 0,
      movedAtMs: state.atMs,
      measuredTripVolts: state.tripIsStale ? null : state.trip.volts,
      noEffectAtMs: null,
      screwFound: false,
    },
  );
}

function arm(state: TrimState, watch: BeepWatch): TrimState {
  const command = { kind: 'hold' as const, ...armPath(state, watch) };
  return { ...state, phase: { kind: 'beeps', step: 'arm', watch }, command };
}

export function observeBeeps(state: TrimState, phase: BeepPhase, seen: TrimObservation): TrimState {
  if (seen.kind === 'screw-found') return phase.step === 'verify' ? state : restartPrompt(state, phase);
  switch (phase.step) {
    case 'arm':
      return seen.kind === 'held' ? armed(state, phase.watch, seen) : state;
    case 'turn':
      return seen.kind === 'sensed' ? sensed(state, phase.watch, seen.output) : state;
    case 'peek':
      return seen.kind === 'held' ? peeked({ ...state, supplyVolts: seen.volts }, phase, seen.output) : state;
    case 'heard':
      return seen.kind === 'waited' ? pauseOver(state, phase.watch) : state;
    case 'measure':
      return seen.kind === 'searched' ? measuredAgain(state, phase.watch, seen.result) : state;
    case 'verify':
      return seen.kind === 'searched' ? judgeVerify(state, seen.result, chooseAgain) : state;
  }
}

function armed(state: TrimState, watch: BeepWatch, seen: { volts: number; output: OutputState }): TrimState {
  const held = { ...state, supplyVolts: seen.volts, heldVolts: watch.holdVolts };
  if (seen.output !== waitingOutput(watch)) {
    if (watch.promptedAtMs !== null) return beep(held, watch);
    return answeredAtOnce(held, watch);
  }
  return watch.promptedAtMs === null ? promptBeep(held, watch) : listen(held, watch);
}

/** The point is past the hold before anyone turned. */
function answeredAtOnce(state: TrimState, watch: BeepWatch): TrimState {
  if (watch.rising) {
    const proved = { minVolts: watch.holdVolts, maxVolts: null };
    const trip = { volts: watch.holdVolts + state.pace.peekVolts, standardUncertaintyVolts: 0.05 };
    return fall(relearn({ ...state, trip, proved }), state.pace.backOffVolts);
  }
  const farther = state.pace.backOffVolts + Math.min(0.1, 0.15 * state.pace.voltsPerTurn);
  const already = watch.tripAtHoldVolts <= state.settings.targetVolts - farther;
  return already ? riseToSecond(state) : fall(state, farther);
}

function promptBeep(state: TrimState, watch: BeepWatch): TrimState {
  const prompted = prompt(state, watch.beep === 1 ? 'beep-1' : 'beep-2', state.advice!);
  if (prompted.phase.kind === 'over') return prompted;
  return listen(prompted, {
    ...watch,
    promptedAtMs: state.atMs,
    movedAtMs: state.atMs,
    nextPeekAtMs: state.atMs + firstPeekAfterMs(state, watch),
  });
}

/** A peek is deaf to the beep, so at the slow pace it waits until the beep is overdue. */
function firstPeekAfterMs(state: TrimState, watch: BeepWatch): number {
  const { pace, prompts } = state;
  if (watch.beep === 1) return peekEveryMs(state);
  const slowVoltsPerSecond = pace.voltsPerTurn * pace.slowTurnsPerSecond;
  const expectedMs = (1000 * Math.abs(watch.tripAtHoldVolts - state.trip.volts)) / slowVoltsPerSecond;
  return (prompts === 0 ? noEffectWithFetchAfterMs : noEffectAfterMs) + 1.5 * expectedMs;
}

const listen = (state: TrimState, watch: BeepWatch): TrimState => ({
  ...state,
  phase: { kind: 'beeps', step: 'turn', watch },
  command: { kind: 'sense' },
});

function sensed(state: TrimState, watch: BeepWatch, output: OutputState): TrimState {
  if (output !== waitingOutput(watch)) return beep(state, watch);
  if (watch.noEffectAtMs !== null && state.atMs - watch.noEffectAtMs > noEffectAnswerMs) return failNoEffect(state);
  if (state.atMs < watch.nextPeekAtMs) return listen(state, watch);
  const place = firstPlace(state, watch);
  if (place) return lookAt({ ...state, phase: { kind: 'beeps', step: 'peek', watch, place } }, place);
  return goOn(state, watch, listen);
}

function peeked(state: TrimState, phase: Extract<BeepPhase, { step: 'peek' }>, output: OutputState): TrimState {
  const judged = judgePeek(state, phase.watch, phase.place, output);
  if ('next' in judged) return lookAt({ ...state, phase: { ...phase, place: judged.next } }, judged.next);
  return learn(state, phase.watch, judged);
}

function learn(state: TrimState, watch: BeepWatch, found: PeekFinding): TrimState {
  const now = state.atMs;
  switch (found.kind) {
    case 'moved':
      // From here it is only known to be somewhere before the hold.
      return arm(foundMovement(state), {
        ...watch,
        nearVolts: null,
        farVolts: found.pastVolts,
        movedAtMs: now,
        nextPeekAtMs: now + noEffectAfterMs,
        noEffectAtMs: null,
        measuredTripVolts: null,
      });
    case 'away':
      return turnedAway(state, watch, found);
    case 'not-away':
      return goOn(state, watch, arm);
    case 'unmoved': {
      const waited = now - watch.promptedAtMs!;
      const again = { ...watch, nextPeekAtMs: now + peekEveryMs(state) };
      if (watch.noEffectAtMs !== null || waited < patienceMs(state, watch)) {
        return arm(state, again);
      }
      return noEffect(state, again);
    }
  }
}

/** A peek is deaf to the beep for about ten commands, so a slow link peeks less often. */
const peekEveryMs = ({ settings }: TrimState) => Math.max(2000, 45 * settings.pollMs);

function patienceMs(state: TrimState, watch: BeepWatch): number {
  return state.prompts === 1 || watch.screwFound ? noEffectWithFetchAfterMs : noEffectAfterMs;
}

function noEffect(state: TrimState, watch: BeepWatch): TrimState {
  if (watch.screwFound) return failNoEffect(state);
  const seconds = Math.round((state.atMs - watch.promptedAtMs!) / 1000);
  return arm(foundNoEffect(state, seconds), { ...watch, noEffectAtMs: watch.noEffectAtMs ?? state.atMs });
}

/** Nothing told by this peek: wait on, and measure again once it has been silent for long. */
function goOn(state: TrimState, watch: BeepWatch, wait: typeof arm): TrimState {
  const again = { ...watch, nextPeekAtMs: state.atMs + peekEveryMs(state) };
  if (state.atMs - watch.movedAtMs < silenceMs) return wait(state, again);
  return {
    ...state,
    stage: 'measuring',
    heldVolts: null,
    supplyVolts: null,
    phase: { kind: 'beeps', step: 'measure', watch },
    command: { kind: 'search', wantedUncertaintyVolts: 0.0025, prior: null, check: false },
  };
}

/** Prompts again from where the point was bracketed. */
function turnedAway(state: TrimState, watch: BeepWatch, found: { fromVolts: number; toVolts: number }): TrimState {
  const hysteresisVolts = releaseFor(state, state.trip.volts) - state.trip.volts;
  const volts = (found.fromVolts + found.toVolts) / 2 - (watch.rising ? 0 : hysteresisVolts);
  const standardUncertaintyVolts = Math.abs(found.fromVolts - found.toVolts) / Math.sqrt(12);
  const wrong = foundWrongWay(state, Math.abs(volts - state.trip.volts));
  const trip = { volts, standardUncertaintyVolts };
  const moved = relearn({ ...wrong, trip, proved: provedBy(trip) });
  return chooseBeep(moved, turnBackVolts);
}

function measuredAgain(
  state: TrimState,
  watch: BeepWatch,
  result: Extract<TrimObservation, { kind: 'searched' }>['result'],
): TrimState {
  const quiet = { ...watch, movedAtMs: state.atMs, nextPeekAtMs: state.atMs + peekEveryMs(state) };
  const stage = watch.beep === 1 ? ('beep-1' as const) : ('beep-2' as const);
  // Still turning while it was measured, or chattering: a beep or the next measurement tells.
  if (result.kind === 'unresolved' || result.kind === 'chatter') {
    if (state.searchRepeated) return finishFailed(state, 'not-steady');
    return arm({ ...state, stage, searchRepeated: true }, quiet);
  }
  const measured = withResult({ ...state, searchRepeated: false }, result);
  const before = watch.measuredTripVolts;
  const least = Math.min(state.pace.peekVolts, state.settings.toleranceVolts) / 2;
  if (before !== null && Math.abs(measured.trip.volts - before) < least) return noEffect({ ...measured, stage }, quiet);
  return chooseBeep(relearn(foundMovement(measured)), state.pace.leadVolts + 0.004);
}

function restartPrompt(state: TrimState, phase: Exclude<BeepPhase, { step: 'verify' }>): TrimState {
  const { watch } = phase;
  if (watch.noEffectAtMs === null) return state;
  const restarted = { ...watch, noEffectAtMs: null, screwFound: true };
  const cleared = { ...state, finding: null, findingVolts: null };
  // A peek in progress re-arms by itself; its prompt counts from here.
  return { ...cleared, phase: { ...phase, watch: { ...restarted, promptedAtMs: state.atMs, movedAtMs: state.atMs } } };
}

/** The board answered: its point is at the hold now and moves on until the hand stops. */
function beep(state: TrimState, watch: BeepWatch): TrimState {
  const { pace, settings } = state;
  const coastingVolts = pace.voltsPerTurn * pace.briskTurnsPerSecond * (reactionSeconds + settings.pollMs / 2000);
  const coasted = watch.beep === 2 ? 0 : watch.rising ? coastingVolts : -coastingVolts;
  const volts = watch.tripAtHoldVolts + coasted;
  const proved = watch.rising
    ? { minVolts: watch.tripAtHoldVolts, maxVolts: null }
    : { minVolts: null, maxVolts: watch.tripAtHoldVolts };
  const trip = { volts, standardUncertaintyVolts: 0.03 };
  const heard = foundMovement({ ...state, trip, proved, tripIsStale: true });
  return {
    ...relearn(heard),
    stage: watch.beep === 1 ? 'beep-1-heard' : 'beep-2-heard',
    phase: { kind: 'beeps', step: 'heard', watch },
    command: { kind: 'wait', milliseconds: watch.beep === 1 ? pauseAfterBeepMs : handsOffMs },
  };
}

function pauseOver(state: TrimState, watch: BeepWatch): TrimState {
  if (watch.beep === 2) {
    return askVerify({ ...state, phase: { kind: 'beeps', step: 'verify' } }, nearTarget(state));
  }
  if (watch.last) return riseToSecond(state);
  return watch.rising ? riseToFirst(state) : fall(state, state.pace.backOffVolts);
}
