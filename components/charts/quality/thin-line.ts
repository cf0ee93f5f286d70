export interface LinePoint {
  x: number;
  y: number;
}

/** Boards a pixel above which a line is drawn as strokes from lowest to highest. */
const mostBoardsAPixel = 1.2;

/** How many boards each stroke stands for; 1: every board is drawn by itself. */
export function boardsAStroke(boards: number, pixels: number): number {
  return boards <= pixels * mostBoardsAPixel ? 1 : Math.ceil((2 * boards) / pixels);
}

const at = (value: number) => Math.round(value * 10) / 10;

/**
 * The line through the points as path data. With `each` boards a stroke, only the lowest and the highest of every stroke are kept,
 * in their order: thousands of boards draw as fast as hundreds, and no extreme is lost.
 */
export function linePath(points: readonly LinePoint[], each: number): string {
  const kept = each === 1 ? points : strokes(points, each);
  return kept.map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${at(x)} ${at(y)}`).join('');
}

function strokes(points: readonly LinePoint[], each: number): LinePoint[] {
  const kept: LinePoint[] = [];
  for (let start = 0; start < points.length; start += each) {
    const group = points.slice(start, start + each);
    const low = group.reduce((a, b) => (b.y < a.y ? b : a));
    const high = group.reduce((a, b) => (b.y > a.y ? b : a));
    if (low === high) kept.push(low);
    else kept.push(...(low.x <= high.x ? [low, high] : [high, low]));
  }
  return kept;
}

/** Dots of a size given by the stroke width, all in one path: round caps on lines without length. */
export const dotsPath = (points: readonly LinePoint[]) => points.map(({ x, y }) => `M${at(x)} ${at(y)}h0`).join('');
