import type { BaselineCandidate } from '../contracts/lot-review';
import { firstHold } from '../statistics/charts/hold-rules';
import { standardised } from '../statistics/charts/individuals';
import { boardsOfBaseline, limitsOfFrozen, lotsBaseline } from './frozen-baseline';

/** What a lot's values would give as a baseline, and whether the usual hold rules are quiet against it; null of too few. */
export function baselineCandidate(values: readonly number[]): Omit<BaselineCandidate, 'lotId' | 'code'> | null {
  if (values.length < boardsOfBaseline) return null;
  const figures = lotsBaseline([values]);
  if (!figures) return null;
  return {
    boards: figures.boards,
    mean: figures.centre,
    sigma: figures.sigma,
    stable: firstHold(standardised(values, limitsOfFrozen(figures))) === null,
  };
}
