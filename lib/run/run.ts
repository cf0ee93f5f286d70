import { nextEnabled } from '../sequence/enabled-steps';
import { kindOf } from '../steps/step-kinds';
import { decideVerdict, verdictOf, type Ending } from '../decision/decide-verdict';
import { failingWhenStopped } from './failing-when-stopped';
import { faultCodes } from './fault-codes';
import { factsAfter, factsAfterAsking, factsAfterTurn, noFacts, type RunFacts } from './facts';
import { interruptionBy } from './interruption';
import { expectedUncertainty } from './rails';
import type { Ask, StepContext, StepEvent, StepTurn } from './machine';
import type { AnswerKind, RunState } from './state';
import type { RunEffect, RunEvent, RunPlan, RunResult } from './types';

export type { RunState } from './state';

/** The next state and what the station is to do, in order; empty when it only has to go on listening. */
export interface Advance {
  state: RunState;
  effects: RunEffect[];
}

/** Switching off is asked again this often when it was not confirmed. */
const mostOffTries = 2;

/** `atMs` is the station's clock, as in the events. */
export function beginRun(plan: RunPlan, atMs: number): Advance {
  const state: RunState = {
    plan,
    startedAtMs: atMs,
    atMs,
    nextId: 1,
    outstanding: null,
    stepIndex: 0,
    machine: null,
    path: [],
    facts: noFacts,
    expectedUncertainty: expectedUncertainty(plan),
    phase: { kind: 'steps' },
    failingWhenStopped: false,
    stoppedAtVolts: null,
  };
  return beginStep(state);
}

/**
 * What follows from an event. Answers to anything but the outstanding effect are ignored, and so is everything after the
 * end. Pure: the same plan and events give the same run.
 */
export function advanceRun(before: RunState, event: RunEvent): Advance {
  if (before.phase.kind === 'over' || isStray(event, before)) return { state: before, effects: [] };
  const answered = 'id' in event && event.id !== null;
  const state: RunState = {
    ...before,
    atMs: event.atMs,
    outstanding: answered ? null : before.outstanding,
    facts: factsAfter(before.facts, event),
  };
  if (state.phase.kind === 'ending') return answered ? afterSwitchingOff(state, state.phase) : { state, effects: [] };
  const interruption = interruptionBy(event, before);
  if (interruption) return end(state, interruption, before);
  if (event.kind === 'fault' || event.kind === 'stop' || event.kind === 'bench-lost' || event.kind === 'shutdown') {
    return { state, effects: [] };
  }
  return advanceStep(state, event);
}

/** An answer to an effect that is not outstanding, or of a kind that does not answer it. */
function isStray(event: RunEvent, { outstanding }: RunState): boolean {
  if (!('id' in event) || event.id === null) return false;
  return event.id !== outstanding?.id || (event.kind !== 'fault' && event.kind !== outstanding.answer);
}

function contextOf({ plan, facts, stepIndex, atMs }: RunState): StepContext {
  return { plan, facts, stepIndex, atMs };
}

function beginStep(state: RunState): Advance {
  const stepIndex = nextEnabled(state.plan.sequence, state.stepIndex);
  const step = state.plan.sequence.steps[stepIndex];
  if (!step) return end(state, { kind: 'complete' }, state);
  const there = { ...state, stepIndex };
  return takeTurn(there, kindOf(step).machine.begin(step, contextOf(there)));
}

function advanceStep(state: RunState, event: StepEvent): Advance {
  const step = state.plan.sequence.steps[state.stepIndex]!;
  return takeTurn(state, kindOf(step).machine.advance(state.machine, event, step, contextOf(state)));
}

function takeTurn(before: RunState, turn: StepTurn<unknown>): Advance {
  const facts = factsAfterTurn(before.facts, turn);
  const state: RunState = facts === before.facts ? before : { ...before, facts };
  if ('ending' in turn) return end(state, turn.ending, state);
  if ('done' in turn) return afterStep(state, turn.goTo ?? null);
  if (turn.ask?.kind === 'supply-on' && state.facts.lidClosed === false) {
    const code = faultCodes.lidOpened;
    const going = { ...state, machine: turn.machine };
    return end(going, { kind: 'no-verdict', reason: 'lid-opened', code, detail: null, fault: null }, going);
  }
  if (turn.ask) return ask(state, turn.ask, turn.machine);
  return { state: { ...state, machine: turn.machine }, effects: [] };
}

/** A branch that names a step that is not there leads past the end: such a run has no verdict. */
function afterStep(state: RunState, goTo: string | null): Advance {
  const { steps } = state.plan.sequence;
  const jumpedTo = goTo === null ? null : steps.findIndex((step) => step.id === goTo && step.enabled);
  const visit = { stepIndex: state.stepIndex, measured: state.facts.measurements.length, jumpedTo };
  const stepIndex = jumpedTo === null ? state.stepIndex + 1 : jumpedTo < 0 ? steps.length : jumpedTo;
  return beginStep({ ...state, path: [...state.path, visit], stepIndex, machine: null });
}

function ask(state: RunState, wish: Ask, machine: unknown = state.machine): Advance {
  const effect = { ...wish, id: state.nextId } as RunEffect;
  return {
    state: {
      ...state,
      machine,
      nextId: state.nextId + 1,
      outstanding: { id: state.nextId, answer: answerTo[wish.kind] },
      facts: factsAfterAsking(state.facts, effect),
    },
    effects: [effect],
  };
}

const answerTo: Record<Ask['kind'], AnswerKind> = {
  'read-fixture': 'fixture-read',
  'prepare-supply': 'prepared',
  'supply-on': 'supply-is-on',
  probe: 'probed',
  sense: 'sensed',
  measure: 'measured',
  'measure-supply': 'supply-measured',
  'measure-wiper': 'wiper-measured',
  pulse: 'pulsed',
  wait: 'waited',
  'supply-off': 'supply-is-off',
};

/** Whatever ends the run: the supply off with read-back first. A record step has just asked for it. */
function end(state: RunState, ending: Ending, before: RunState): Advance {
  const decision = decideVerdict({
    ending,
    sequence: state.plan.sequence,
    path: state.path,
    measurements: state.facts.measurements,
    supplyOff: state.facts.supply.state === 'off' && state.facts.supply.volts !== null,
  });
  const { supply } = before.facts;
  const decided: RunState = {
    ...state,
    failingWhenStopped: verdictOf(decision) === 'no-verdict' && failingWhenStopped(state),
    stoppedAtVolts: supply.state === 'on' ? supply.volts : null,
  };
  if ('verdict' in decision) return close({ ...decided, phase: { kind: 'over', decision } });
  return ask({ ...decided, phase: { kind: 'ending', decision, tries: 1 } }, { kind: 'supply-off' });
}

function afterSwitchingOff(state: RunState, phase: Extract<RunState['phase'], { kind: 'ending' }>): Advance {
  const off = state.facts.supply.state === 'off';
  if (!off && phase.tries < mostOffTries) {
    return ask({ ...state, phase: { ...phase, tries: phase.tries + 1 } }, { kind: 'supply-off' });
  }
  const facts: RunFacts = off ? state.facts : { ...state.facts, supply: { state: 'maybe-on' } };
  return close({ ...state, facts, phase: { kind: 'over', decision: phase.decision } });
}

const close = (state: RunState): Advance => ({
  state: { ...state, outstanding: null },
  effects: [{ kind: 'record-run' }],
});

/** The result once the run is over; null before. */
export function resultOf({ phase, facts, startedAtMs, failingWhenStopped: failing }: RunState): RunResult | null {
  if (phase.kind !== 'over') return null;
  const { decision } = phase;
  const verdict = verdictOf(decision);
  const rejected = 'kind' in decision && decision.kind === 'reject' ? decision : null;
  const unjudged = 'kind' in decision && decision.kind === 'no-verdict' ? decision : null;
  const { supply } = facts;
  return {
    verdict,
    rejectReason: rejected?.reason ?? null,
    likelyCause: rejected?.cause ?? null,
    noVerdictReason: unjudged?.reason ?? null,
    faultCode: unjudged?.code ?? null,
    faultDetail: unjudged?.fault ?? null,
    failingWhenStopped: failing,
    supplyOff:
      supply.state === 'off' && supply.volts !== null
        ? { confirmed: true, volts: supply.volts, by: supply.by }
        : { confirmed: false, volts: null, by: null },
    measurements: facts.measurements,
    trimRounds: facts.trimRounds,
    turnsAdvised: facts.turnsAdvised,
    adjustments: facts.adjustments.map((each) => ({ ...each, atMs: each.atMs - startedAtMs })),
  };
}
