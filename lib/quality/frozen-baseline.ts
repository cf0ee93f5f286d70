import { chartConstants } from '../statistics/charts/chart-constants';
import { individualsBaseline, type IndividualsBaseline } from '../statistics/charts/individuals';

/** First-attempt values of a lot after which its own baseline is frozen; 20 to 30 are usual. */
export const boardsOfBaseline = 30;

export interface FrozenFigures {
  centre: number;
  sigma: number;
  boards: number;
}

/** What is stored of a lot's own baseline: from its first thirty values. Null before there are so many, or without a spread. */
export function firstBoardsBaseline(values: readonly number[]): FrozenFigures | null {
  if (values.length < boardsOfBaseline) return null;
  return figuresOf(individualsBaseline(values.slice(0, boardsOfBaseline)));
}

/** The same from whole lots; a lot's first board has no moving range to the lot before. */
export function lotsBaseline(lots: readonly (readonly number[])[]): FrozenFigures | null {
  const starts = lots.map((_, i) => lots.slice(0, i).reduce((n, lot) => n + lot.length, 0));
  return figuresOf(individualsBaseline(lots.flat(), starts));
}

function figuresOf(found: ReturnType<typeof individualsBaseline>): FrozenFigures | null {
  return found.kind === 'found' ? { centre: found.individuals.centre, sigma: found.sigma, boards: found.count } : null;
}

/** Limits of both charts from what was stored. */
export function limitsOfFrozen({ centre, sigma, boards }: FrozenFigures): IndividualsBaseline {
  const { d2, D4 } = chartConstants(2);
  const meanRange = sigma * d2;
  return {
    kind: 'found',
    count: boards,
    individuals: { centre, lower: centre - 3 * sigma, upper: centre + 3 * sigma },
    movingRange: { centre: meanRange, lower: null, upper: D4 * meanRange },
    sigma,
  };
}
