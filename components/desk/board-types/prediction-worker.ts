import { predictBoardType } from '@/lib/circuit/monte-carlo/predict-board-type';
import type { BoardTypePrediction } from '@/lib/circuit/monte-carlo/types';
import type { BoardType } from '@/lib/contracts/board-type';
import { wichmannHill } from '@/lib/statistics/wichmann-hill';

export interface PredictionAnswer {
  prediction: BoardTypePrediction;
  /** False: from few boards, a better one follows. */
  whole: boolean;
}

/** The same boards every time, so that a change of a value is what changes the picture. */
const seed = 1210;
const quickBoards = 1_000;

/** Runs beside the page: takes a board type, answers twice. */
self.onmessage = ({ data }: MessageEvent<BoardType>) => {
  const answer = (boards: number | undefined, whole: boolean) =>
    self.postMessage({ prediction: predictBoardType(data, { random: wichmannHill(seed), boards }), whole });
  answer(quickBoards, false);
  answer(undefined, true);
};
