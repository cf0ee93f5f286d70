import { keptOrder } from './kept-order';

/** A step that both moved, to different places; `after` is the one it follows there, null the beginning. */
export interface PlaceConflict {
  id: string;
  after: string | null;
}

interface Orders {
  base: readonly string[];
  mine: readonly string[];
  theirs: readonly string[];
  /** What stands in the merged sequence. */
  kept: ReadonlySet<string>;
}

/** My order with their moves and their new steps put after the step that they follow there. What both moved stays where I put it. */
export function mergeOrder({ base, mine, theirs, kept }: Orders): { order: string[]; conflicts: PlaceConflict[] } {
  const order = mine.filter((id) => kept.has(id));
  const conflicts: PlaceConflict[] = [];
  const [movedHere, movedThere] = [moved(base, mine), moved(base, theirs)];
  theirs.forEach((id, place) => {
    if (!kept.has(id)) return;
    const isHere = order.includes(id);
    if (isHere && !movedThere.has(id)) return;
    const after = theirs.slice(0, place).findLast((other) => order.includes(other)) ?? null;
    if (isHere && movedHere.has(id)) {
      if ((order[order.indexOf(id) - 1] ?? null) !== after) conflicts.push({ id, after });
      return;
    }
    if (isHere) order.splice(order.indexOf(id), 1);
    order.splice(after === null ? 0 : order.indexOf(after) + 1, 0, id);
  });
  return { order, conflicts };
}

function moved(before: readonly string[], after: readonly string[]): Set<string> {
  const stayed = keptOrder(before, after);
  return new Set(after.filter((id) => before.includes(id) && !stayed.has(id)));
}
