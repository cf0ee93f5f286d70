import type { DryRunResult } from '@/lib/contracts/dry-run';

/** What the column "Boards lost here" shows in a step's row. `released` is null where nothing is released. */
export interface LostAtStep {
  draft: number;
  released: number | null;
  /** One square stands for so many boards, the same in every row. */
  boardsASquare: number;
}

const mostSquares = 16;

/** Boards lost at each step, by step id; a step that lost none is there with 0. Null before the first boards are done. */
export function lostAtSteps(result: DryRunResult | null, stepIds: readonly string[]): Map<string, LostAtStep> | null {
  if (!result) return null;
  const { draft, released } = result;
  const most = Math.max(0, ...stepIds.flatMap((id) => [draft.lostAt[id] ?? 0, released?.lostAt[id] ?? 0]));
  const boardsASquare = squareFor(most);
  return new Map(
    stepIds.map((id) => [
      id,
      { draft: draft.lostAt[id] ?? 0, released: released ? (released.lostAt[id] ?? 0) : null, boardsASquare },
    ]),
  );
}

/** 1, 2, 5, 10, 20, 50 … boards, so that no row needs more squares than fit. */
function squareFor(most: number): number {
  for (let decade = 1; ; decade *= 10) {
    const fits = [1, 2, 5].map((step) => step * decade).find((each) => most / each <= mostSquares);
    if (fits !== undefined) return fits;
  }
}
