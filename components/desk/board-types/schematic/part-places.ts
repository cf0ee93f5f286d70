/** Where a part's name and fields stand in the drawing of 856 by 420, and where its symbol can be pointed at. Pixels. */
export interface PartPlace {
  x: number;
  y: number;
  /** x, y, width, height of the symbol. */
  symbol: readonly [number, number, number, number];
  /** Value above tolerance, where there is no room beside it. */
  stacked?: true;
}

export const drawingWidth = 856;
export const drawingHeight = 420;

export const partPlaces: Record<string, PartPlace> = {
  reservoir: { x: 68, y: 166, symbol: [26, 182, 40, 22] },
  'upper-end': { x: 253, y: 60, symbol: [222, 59, 20, 57] },
  trimmer: { x: 253, y: 128, symbol: [222, 165, 20, 63] },
  travel: { x: 253, y: 208, symbol: [222, 165, 20, 63] },
  'lower-end': { x: 253, y: 278, symbol: [222, 277, 20, 57] },
  bias: { x: 446, y: 52, symbol: [418, 50, 20, 56] },
  zener: { x: 452, y: 292, symbol: [406, 274, 44, 36] },
  feedback: { x: 596, y: 304, symbol: [600, 275, 64, 20] },
  comparator: { x: 600, y: 60, symbol: [572, 126, 96, 99] },
  load: { x: 786, y: 240, symbol: [734, 251, 44, 69], stacked: true },
};
