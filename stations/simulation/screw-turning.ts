/** A hand turning a screw at an even pace; turns from the anticlockwise end, clockwise positive. */
export interface ScrewTurning {
  fromTurns: number;
  byTurns: number;
  startedMs: number;
  turnsPerSecond: number;
}

/** Where the hand has got to, and whether it is done. Any end stop is the screw's own. */
export function handAt({ fromTurns, byTurns, startedMs, turnsPerSecond }: ScrewTurning, ms: number) {
  const moved = ((ms - startedMs) / 1000) * turnsPerSecond;
  const done = moved >= Math.abs(byTurns);
  return { turns: fromTurns + Math.sign(byTurns) * Math.min(moved, Math.abs(byTurns)), done };
}
