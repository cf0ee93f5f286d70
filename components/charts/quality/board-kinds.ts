import type { LotReview } from '@/lib/contracts/lot-review';

/** How a measured board is marked on the chart. */
export type BoardKind = 'plain' | 'run' | 'beyond' | 'rejected';

/**
 * One board, one mark: a rejected board is the red square wherever it lies, then a board beyond the control limits by rule 1, then a
 * board of a run. By place in test order, from 0; null where nothing was measured.
 */
export function boardKinds({ points, stretches }: Pick<LotReview, 'points' | 'stretches'>): (BoardKind | null)[] {
  const kinds = points.values.map((value, place): BoardKind | null =>
    value === null ? null : points.marks[place] === 'R' ? 'rejected' : 'plain',
  );
  // Runs first, so that a point beyond a limit keeps its triangle.
  const mark = (from: number, to: number, kind: BoardKind) => {
    for (let place = from - 1; place < to; place++)
      if (kinds[place] !== null && kinds[place] !== 'rejected') kinds[place] = kind;
  };
  for (const { rule, from, to } of stretches) if (rule !== 1) mark(from, to, 'run');
  for (const { rule, from, to } of stretches) if (rule === 1) mark(from, to, 'beyond');
  return kinds;
}
