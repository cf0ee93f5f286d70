import { chartConstants } from '../charts/chart-constants';
import { rangeDivisor } from '../charts/range-constants';
import { meanOf } from '../summary/moments';
import type { StudyCells } from './study-cells';

const rangeOf = (values: readonly number[]) => Math.max(...values) - Math.min(...values);

export interface AverageRange {
  /** Range of every cell, `ranges[board][operator]`. */
  ranges: number[][];
  meanRange: number;
  /** Above this a range is out of control. */
  rangeLimit: number;
  /** Mean of every operator over all boards, and their range. */
  operatorMeans: number[];
  operatorRange: number;
  boardRange: number;
  /** Standard deviations, in the unit of the readings. */
  repeatability: number;
  operator: number;
  /** The operators' spread is below what the repeats explain, and was set to 0. */
  operatorNegative: boolean;
  gauge: number;
  board: number;
  total: number;
}

/**
 * Average-and-range method of a balanced crossed study; it knows no interaction. Factors K1 = 1/d2 of the trials, K2 and K3 =
 * 1/d2* of the operators and boards (exact; printed tables have four digits). Up to 50 boards, operators, trials. AIAG MSA,
 * 4th ed., III B.
 */
export function averageRange({ values, trials }: StudyCells): AverageRange {
  const boards = values.length;
  const operators = values[0]!.length;
  const ranges = values.map((board) => board.map(rangeOf));
  const meanRange = meanOf(ranges.flat());
  const { d2, D4 } = chartConstants(trials);
  const repeatability = meanRange / d2;
  const operatorMeans = values[0]!.map((_, j) => meanOf(values.flatMap((board) => board[j]!)));
  const operatorRange = rangeOf(operatorMeans);
  const ofOperators = (operatorRange / rangeDivisor(operators, 1)) ** 2 - repeatability ** 2 / (boards * trials);
  const operator = Math.sqrt(Math.max(0, ofOperators));
  const boardRange = rangeOf(values.map((board) => meanOf(board.flat())));
  const board = boardRange / rangeDivisor(boards, 1);
  const gauge = Math.hypot(repeatability, operator);
  return {
    ranges,
    meanRange,
    rangeLimit: D4 * meanRange,
    operatorMeans,
    operatorRange,
    boardRange,
    repeatability,
    operator,
    operatorNegative: ofOperators < 0,
    gauge,
    board,
    total: Math.hypot(gauge, board),
  };
}
