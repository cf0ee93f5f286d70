import type { RunStretch } from '../contracts/lot-review';
import type { RunRule } from '../statistics/charts/run-rules';

/** Nelson's rules in words, for the switches. */
export const ruleWords: Record<RunRule, string> = {
  1: 'One board beyond three sigma',
  2: 'Nine in a row on one side of the centre',
  3: 'Six in a row rising or falling',
  4: 'Fourteen in a row alternating',
  5: 'Two of three beyond two sigma, on one side',
  6: 'Four of five beyond one sigma, on one side',
  7: 'Fifteen in a row within one sigma',
  8: 'Eight in a row beyond one sigma, on both sides',
};

/** "Boards 201 to 210: 10 in a row above centre". */
export function stretchWords(stretch: RunStretch): string {
  const { from, to } = stretch;
  return `${from === to ? `Board ${from}` : `Boards ${from} to ${to}`}: ${whatOf(stretch)}`;
}

/** The same for all of them, boards beyond one control limit in a single line. */
export function stretchList(stretches: readonly RunStretch[]): { rule: RunRule; words: string }[] {
  const beyond = (['above', 'below'] as const).flatMap((side) => {
    const single = stretches.filter((stretch) => stretch.rule === 1 && stretch.side === side);
    if (single.length < 2) return single.map((stretch) => ({ rule: stretch.rule, words: stretchWords(stretch) }));
    const boards = single.map(({ from }) => from);
    return [{ rule: 1 as const, words: `Boards ${listed(boards)}: ${whatOf(single[0]!)}` }];
  });
  const runs = stretches.filter(({ rule }) => rule !== 1);
  return [...beyond, ...runs.map((stretch) => ({ rule: stretch.rule, words: stretchWords(stretch) }))];
}

const mostListed = 8;

function listed(boards: readonly number[]): string {
  if (boards.length > mostListed)
    return `${boards.slice(0, mostListed).join(', ')} and ${boards.length - mostListed} more`;
  return `${boards.slice(0, -1).join(', ')} and ${boards.at(-1)}`;
}

function whatOf({ rule, boards, side, direction }: RunStretch): string {
  switch (rule) {
    case 1:
      return `beyond the ${side === 'above' ? 'upper' : 'lower'} control limit`;
    case 2:
      return `${boards} in a row ${side} centre`;
    case 3:
      return `${boards} in a row ${direction}`;
    case 4:
      return `${boards} in a row alternating`;
    case 5:
      return boards <= 3
        ? `two of three beyond two sigma ${side} centre`
        : `${boards} mostly beyond two sigma ${side} centre`;
    case 6:
      return boards <= 5
        ? `four of five beyond one sigma ${side} centre`
        : `${boards} mostly beyond one sigma ${side} centre`;
    case 7:
      return `${boards} in a row within one sigma`;
    case 8:
      return `${boards} in a row beyond one sigma on both sides`;
  }
}
