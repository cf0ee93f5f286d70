import type { Say } from '../contracts/bench-view';
import type { BenchAsk, BenchEffect, BenchState, BenchStep } from './types';

/** The ways in which one event can move a bench on. */

export function stay(state: BenchState, ...effects: BenchEffect[]): BenchStep {
  return { state, effects };
}

/** A refusal is shown until the next scan or action that is taken. */
export function refuse(state: BenchState, refusal: Say, atIso: string, serial: string | null = null): BenchStep {
  return stay({ ...state, refusal: { ...refusal, serial, atIso } });
}

export function askServer(state: BenchState, ask: BenchAsk): BenchStep {
  const id = state.lastId + 1;
  return stay({ ...state, lastId: id, asked: { id, ask }, refusal: null }, { kind: 'ask', id, ask });
}

/** Nobody at the bench. A reject that still waits for its bin stays with the station. */
export function signOut(state: BenchState): BenchState {
  return {
    ...state,
    phase: { kind: 'badge' },
    operator: null,
    lot: null,
    next: null,
    trial: null,
    refusal: null,
    last: null,
  };
}

/** Where a signed-in bench with a lot rests between boards. */
export function rest(state: BenchState): BenchState {
  if (state.pendingBin) return { ...state, phase: { kind: 'bin', bin: state.pendingBin } };
  return { ...state, phase: { kind: 'idle', next: null } };
}

/** Signed in, and neither testing nor owing a bin scan. */
export function atRest(state: BenchState): boolean {
  return state.operator !== null && ['choose-lot', 'idle', 'over', 'daily-check'].includes(state.phase.kind);
}
