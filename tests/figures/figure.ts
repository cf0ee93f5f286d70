/** One figure: what `npm run figures -- NAME` measures, and what it must reach. */
export interface Figure {
  name: string;
  /** What it shows, in a line. */
  title: string;
  /** `share` of the boards, 1 for the figure as published; less to try something out. */
  run(progress: (line: string) => void, share: number): Promise<FigureReport>;
}

export type FigureRow = Record<string, string | number | null>;

export interface FigureTarget {
  name: string;
  value: number;
  /** The value must not exceed it, or with `atLeast` not stay below it. */
  limit: number;
  met: boolean;
}

export interface FigureReport {
  rows: FigureRow[];
  targets: FigureTarget[];
  /** Printed below the table. */
  notes: string[];
}

export const atMost = (name: string, value: number, limit: number): FigureTarget => ({
  name,
  value,
  limit,
  met: value <= limit,
});

export const below = (name: string, value: number, limit: number): FigureTarget => ({
  name,
  value,
  limit,
  met: value < limit,
});

export const atLeast = (name: string, value: number, limit: number): FigureTarget => ({
  name,
  value,
  limit,
  met: value >= limit,
});
