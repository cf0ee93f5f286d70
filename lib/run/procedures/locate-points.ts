import type { SearchResult } from '../../search/types';
import type { Points } from '../facts';
import type { Answer, Ask, ProcedureTurn, StepContext } from '../machine';
import { advanceSearchPoints, beginSearchPoints, type SearchPoints, type SearchWish } from './search-points';
import { advanceUnfound, beginUnfound, type Unfound, type UnfoundResult } from './unfound';

export type LocatePoints =
  | { stage: 'searching'; wish: Omit<SearchWish, 'unassuming'>; again: boolean; points: SearchPoints }
  | { stage: 'unfound'; unfound: Unfound };
export type Located = { found: Points; result: SearchResult } | UnfoundResult;
type LocateTurn = ProcedureTurn<LocatePoints, Located>;

/** Both points, or why the board has none. A search that does not resolve is repeated once without prior and coupling. */
export function beginLocatePoints(wish: Omit<SearchWish, 'unassuming'>, context: StepContext) {
  return search(wish, context, false);
}

function search(
  wish: Omit<SearchWish, 'unassuming'>,
  context: StepContext,
  again: boolean,
): { machine: LocatePoints; ask: Ask } {
  const { machine, ask } = beginSearchPoints({ ...wish, unassuming: again }, context);
  return { machine: { stage: 'searching', wish, again, points: machine }, ask };
}

export function advanceLocatePoints(machine: LocatePoints, answer: Answer, context: StepContext): LocateTurn | null {
  if (machine.stage === 'unfound') return unfoundTurn(advanceUnfound(machine.unfound, answer, context));
  const turn = advanceSearchPoints(machine.points, answer, context);
  if (!turn) return null;
  if ('ask' in turn) return { machine: { ...machine, points: turn.machine }, ask: turn.ask };
  const { result } = turn;
  if (result.kind === 'found') {
    return { result: { found: { trip: result.trip, release: result.release, settles: result.settles }, result } };
  }
  if (result.kind === 'unresolved' && !machine.again) return search(machine.wish, context, true);
  return unfoundTurn(beginUnfound(result, context));
}

function unfoundTurn(turn: ProcedureTurn<Unfound, UnfoundResult> | null): LocateTurn | null {
  return turn && 'ask' in turn ? { machine: { stage: 'unfound', unfound: turn.machine }, ask: turn.ask } : turn;
}

/** Settles of the search so far; null while looking closer at a board without points. */
export function settlesSoFar(machine: LocatePoints): number | null {
  return machine.stage === 'searching' ? machine.points.settles : null;
}
