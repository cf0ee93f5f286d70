import type { AnyStep } from '../steps/step-common';
import type { Ending } from '../decision/decide-verdict';
import type { RunView, Say } from '../contracts/bench-view';
import type { RunFacts } from './facts';
import type { Measurement, RunEffect, RunEvent, RunPlan } from './types';

type WithoutId<E> = E extends { id: number } ? Omit<E, 'id'> : never;

/** An effect as a step asks for it; the run gives it its number. */
export type Ask = WithoutId<RunEffect>;
/** What the station answered to the outstanding effect. */
export type Answer = Extract<RunEvent, { id: number }>;
/** What a person or the fixture does while a step listens. */
export type Act = Extract<RunEvent, { kind: 'lid' | 'board' | 'will-not-turn' | 'screw-found' | 'confirm' | 'answer' }>;
export type StepEvent = Answer | Act;

/** What a step may know. */
export interface StepContext {
  plan: RunPlan;
  facts: RunFacts;
  stepIndex: number;
  atMs: number;
}

/** What a step learned in this turn. */
export interface Learned {
  facts?: Partial<RunFacts>;
  measurements?: Measurement[];
}

/**
 * A step goes on, asking for something or (`ask` null) waiting for what it asked or for a person; or it has ended. `goTo` is the
 * id of the step that follows where it is not the next one.
 */
export type StepTurn<M> = Learned &
  ({ machine: M; ask: Ask | null } | { done: true; goTo?: string } | { ending: Ending });

/** One kind of step: a small machine that never sees an event not meant for it. */
export interface StepMachine<S extends AnyStep, M> {
  begin(step: S, context: StepContext): StepTurn<M>;
  advance(machine: M, event: StepEvent, step: S, context: StepContext): StepTurn<M>;
  view(machine: M, step: S, context: StepContext): RunView['screen'];
}

/** A part of a step that several kinds share. It asks until it has its result. */
export type ProcedureTurn<M, R> = { machine: M; ask: Ask } | { result: R };

export function measuring(what: Say, done = 0, of: number | null = null): RunView['screen'] {
  return { kind: 'measuring', what, done, of };
}

/** No change: an event that this stage does not care for. */
export const stay = <M>(machine: M): StepTurn<M> => ({ machine, ask: null });
