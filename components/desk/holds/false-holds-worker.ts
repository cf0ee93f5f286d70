import { falseHolds, type FalseHolds } from '@/lib/statistics/charts/false-holds';
import type { HoldRule } from '@/lib/statistics/charts/hold-rules';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

export interface FalseHoldsQuestion {
  boardsPerLot: number;
  holdRules: HoldRule[];
  baselineBoards: number | null;
}

export interface FalseHoldsAnswer {
  answer: FalseHolds;
  /** False: from few lots, a better one follows. */
  whole: boolean;
}

/** The same lots every time, so that a change of a rule is what changes the figure. */
const seed = 240;
const quickLots = 200;
/** Boards drawn at most for the whole answer, so that large lots do not keep the reader waiting. */
const mostBoards = 480_000;

/** Runs beside the page: takes the rules, answers twice. */
self.onmessage = ({ data }: MessageEvent<FalseHoldsQuestion>) => {
  const answer = (lots: number, whole: boolean) =>
    self.postMessage({ answer: falseHolds({ ...data, lots, uniform: wichmannHill(seed) }), whole });
  const wanted = Math.min(2_000, Math.max(100, Math.floor(mostBoards / data.boardsPerLot)));
  if (wanted > quickLots) answer(quickLots, false);
  answer(wanted, true);
};
