import { raisingTurnsTo, turnsToEnd, voltsPerTurnOf, type BoardEstimate } from './board-estimate';
import { wordTurns } from './turn-words';
import type { Direction, TrimSettings, TurnWords } from './types';

/** Which way and how far, exact. */
export interface Advice {
  direction: Direction;
  /** Positive, never above 4 nor past the end stop as estimated. */
  turns: number;
  words: TurnWords;
  raises: boolean;
  /** What cut the turn short of what is needed. */
  cutBy: 'most-at-once' | 'end-stop' | null;
}

/** More than this is not asked at once: people lose count. Measure again. */
export const mostTurnsAtOnce = 4;

export interface AdviceBasis {
  settings: TrimSettings;
  estimate: BoardEstimate;
  /** The screw was seen to work against the type's direction. */
  reversed: boolean;
}

/** Advice to bring the trip point to `toVolts`; `slackTurns` is added, since the first of a reversal does nothing. */
export function adviseTo(basis: AdviceBasis, toVolts: number, slackTurns = 0): Advice {
  return adviseTurns(basis, raisingTurnsTo(basis.estimate, basis.settings, toVolts), slackTurns);
}

/** Advice to turn by `raisingTurns`, negative where they are to lower the trip point. */
export function adviseTurns(basis: AdviceBasis, raisingTurns: number, slackTurns = 0): Advice {
  const { estimate, settings, reversed } = basis;
  const raises = raisingTurns >= 0;
  const end = Math.max(0, turnsToEnd(estimate, settings, raises));
  const wanted = Math.abs(raisingTurns);
  const turns = Math.min(mostTurnsAtOnce, Math.min(wanted, end) + slackTurns);
  return {
    direction: turningDirection(settings, raises, reversed),
    turns,
    words: wordTurns(turns, voltsPerTurnOf(estimate, settings), settings.toleranceVolts),
    raises,
    cutBy: turns >= wanted ? null : turns >= mostTurnsAtOnce ? 'most-at-once' : 'end-stop',
  };
}

export function turningDirection(settings: TrimSettings, raises: boolean, reversed: boolean): Direction {
  const clockwiseRaises = (settings.trimmer.clockwise === 'raises') !== reversed;
  return raises === clockwiseRaises ? 'clockwise' : 'anticlockwise';
}
