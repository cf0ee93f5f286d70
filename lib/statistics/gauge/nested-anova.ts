import { meanOf, squaresAboutMean } from '../summary/moments';
import { anovaRow, testedAgainst, type AnovaRow } from './anova-row';
import { differenceComponent, residualComponent, type Component } from './component';

/** `values[operator][board][trial]`: every operator has boards of their own. */
type NestedValues = readonly (readonly (readonly number[])[])[];

export type NestedAnova =
  | {
      kind: 'found';
      rows: Record<'operator' | 'board' | 'repeat', AnovaRow>;
      components: Record<'operator' | 'board' | 'repeatability' | 'gauge', Component>;
    }
  | { kind: 'tooFew' | 'unbalanced' | 'noSpread' };

/**
 * Nested gauge study, for tests that a board does not survive twice at different benches: boards within operators, repeats
 * within boards, all random and balanced. Operators are tested against boards, boards against repeats. Negative components
 * are set to 0 and said. NIST/SEMATECH e-Handbook 7.4.3.8 (nested), 2.4.3.
 */
export function nestedAnova(values: NestedValues, confidence = 0.95): NestedAnova {
  const o = values.length;
  const p = values[0]?.length ?? 0;
  const r = values[0]?.[0]?.length ?? 0;
  if (o < 2 || p < 2 || r < 2) return { kind: 'tooFew' };
  if (values.some((boards) => boards.length !== p || boards.some((cell) => cell.length !== r)))
    return { kind: 'unbalanced' };
  const origin = values[0]![0]![0]!;
  const cells = values.map((boards) => boards.map((cell) => cell.map((value) => value - origin)));
  const means = cells.map((boards) => boards.map(meanOf));
  const sum = (parts: number[]) => parts.reduce((total, part) => total + part, 0);
  const operator = anovaRow(p * r * squaresAboutMean(means.map(meanOf)), o - 1);
  const board = anovaRow(r * sum(means.map(squaresAboutMean)), o * (p - 1));
  const repeat = anovaRow(sum(cells.flat().map(squaresAboutMean)), o * p * (r - 1));
  if (!(repeat.meanSquare > 0 && board.meanSquare > 0)) return { kind: 'noSpread' };
  const ofOperator = differenceComponent(operator, board, 1 / (p * r), confidence);
  const repeatability = residualComponent(repeat, confidence);
  return {
    kind: 'found',
    rows: { operator: testedAgainst(operator, board), board: testedAgainst(board, repeat), repeat },
    components: {
      operator: ofOperator,
      board: differenceComponent(board, repeat, 1 / r, confidence),
      repeatability,
      gauge: { variance: ofOperator.variance + repeatability.variance, negative: false, interval: null },
    },
  };
}
