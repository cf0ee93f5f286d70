import { exactSum } from '../summary/exact-sum';
import { meanOf, squaresAboutMean } from '../summary/moments';
import { anovaRow, testedAgainst, type AnovaRow } from './anova-row';
import type { StudyCells } from './study-cells';

export type CrossedRow = 'board' | 'operator' | 'interaction' | 'repeat';

/**
 * Two-way analysis of variance of a balanced crossed study, boards and operators random: both are tested against the
 * interaction, the interaction against the repeats. `pooled` joins interaction and repeats into one residual and tests both
 * against that. Sums about the first reading, so constant digits cost nothing. NIST/SEMATECH e-Handbook 7.4.3.7; AIAG MSA, 4th ed., III B.
 */
export function crossedAnova({ values, trials }: StudyCells): {
  full: Record<CrossedRow, AnovaRow>;
  pooled: Record<Exclude<CrossedRow, 'interaction'>, AnovaRow>;
} {
  const origin = values[0]![0]![0]!;
  const cells = values.map((board) => board.map((cell) => cell.map((value) => value - origin)));
  const boards = cells.length;
  const operators = cells[0]!.length;
  const boardMeans = cells.map((board) => meanOf(board.flat()));
  const operatorMeans = cells[0]!.map((_, j) => meanOf(cells.flatMap((board) => board[j]!)));
  const grandMean = meanOf(boardMeans);
  const interaction = cells.flatMap((board, i) =>
    board.map((cell, j) => (meanOf(cell) - boardMeans[i]! - operatorMeans[j]! + grandMean) ** 2),
  );
  const ofBoards = anovaRow(operators * trials * squaresAboutMean(boardMeans), boards - 1);
  const ofOperators = anovaRow(boards * trials * squaresAboutMean(operatorMeans), operators - 1);
  const ofInteraction = anovaRow(trials * exactSum(interaction), (boards - 1) * (operators - 1));
  const ofRepeats = anovaRow(exactSum(cells.flat().map(squaresAboutMean)), boards * operators * (trials - 1));
  const residual = anovaRow(ofInteraction.squares + ofRepeats.squares, ofInteraction.degrees + ofRepeats.degrees);
  return {
    full: {
      board: testedAgainst(ofBoards, ofInteraction),
      operator: testedAgainst(ofOperators, ofInteraction),
      interaction: testedAgainst(ofInteraction, ofRepeats),
      repeat: ofRepeats,
    },
    pooled: {
      board: testedAgainst(ofBoards, residual),
      operator: testedAgainst(ofOperators, residual),
      repeat: residual,
    },
  };
}
