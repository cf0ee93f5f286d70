import type { Advice } from './advice';
import { turnsToEnd } from './board-estimate';
import { finishFailed, type TrimState } from './state';

/** Nearer to the end stop than this share of the travel there is nothing left to turn. */
const endShare = 0.01;

/**
 * Counts a prompt and shows it. Too many of them end the trim, whatever the board answers, and so does a target beyond the
 * end stop with the screw at it.
 */
export function prompt(state: TrimState, stage: TrimState['stage'], advice: Advice): TrimState {
  if (state.prompts >= 3 * state.settings.mostRounds + 3) return finishFailed(state, 'too-many-rounds');
  if (advice.cutBy === 'end-stop' && advice.turns < endShare * state.settings.trimmer.turns) {
    return finishFailed(state, 'end-of-travel');
  }
  return {
    ...state,
    stage,
    advice,
    tripIsStale: true,
    lastRaised: advice.raises,
    prompts: state.prompts + 1,
    turnsAdvised: state.turnsAdvised + advice.turns,
  };
}

/**
 * The trip point moved away from the target by `movedVolts`. Most likely the hand turned against the prompt, so the first
 * time the direction stays; the second time in a row the screw is taken to work the other way round on this board.
 */
export function foundWrongWay(state: TrimState, movedVolts: number): TrimState {
  const wrongWays = state.wrongWays + 1;
  const reversed = wrongWays % 2 === 0 ? !state.reversed : state.reversed;
  return { ...state, wrongWays, reversed, finding: 'wrong-way', findingVolts: movedVolts };
}

/** The trip point moved as asked: earlier findings are over. */
export function foundMovement(state: TrimState): TrimState {
  return { ...state, wrongWays: 0, finding: null, findingVolts: null };
}

/** Nothing changed for `seconds` of the prompt: shown to the operator, who chooses while the station watches on. */
export function foundNoEffect(state: TrimState, seconds: number): TrimState {
  return { ...state, finding: 'no-effect', findingVolts: seconds };
}

/** The operator has a minute to answer the finding. */
export const noEffectAnswerMs = 60_000;

/** Turning changes nothing: the end of travel where the screw was near it, else wiper, screw or part. */
export function failNoEffect(state: TrimState): TrimState {
  const { estimate, settings, advice } = state;
  const left = turnsToEnd(estimate, settings, advice?.raises ?? true);
  const doubt = 2 * Math.sqrt(estimate.covariance[0]![0]!) * settings.trimmer.turns;
  const nearEnd = left <= Math.min(0.06 * settings.trimmer.turns, 0.02 * settings.trimmer.turns + doubt);
  return finishFailed(state, nearEnd ? 'end-of-travel' : 'no-effect');
}

/** The operator says that the screw does not turn. Where no effect was measured already, that is the finding. */
export function observeWillNotTurn(state: TrimState): TrimState {
  return state.finding === 'no-effect' ? failNoEffect(state) : finishFailed(state, 'will-not-turn');
}
