import { meanOf, pooledDeviation, standardDeviation } from '../summary/moments';

/** The mean of one day's readings of one board in one run of the study, with their standard deviation. */
export interface DailyMean {
  run: string;
  board: string;
  mean: number;
  deviation: number;
  readings: number;
}

export interface NestedLevel {
  /** Pooled standard deviation, in the unit of the readings. */
  deviation: number;
  degrees: number;
}

/** `unbalanced`: a level has nowhere two members, so it has no degrees of freedom. */
export type NestedLevels =
  | { kind: 'found'; repeats: NestedLevel; days: NestedLevel; runs: NestedLevel }
  | { kind: 'tooFew'; level: 'repeats' | 'days' | 'runs' };

/**
 * Three-level nested study: repeats within a day, days within a run, runs. Each is the pooled standard deviation of the
 * means of the level below, per board. NIST/SEMATECH e-Handbook 2.4.3 and 2.6.1.
 */
export function nestedLevels(days: readonly DailyMean[]): NestedLevels {
  const repeats = level(days.map(({ deviation, readings }) => ({ deviation, degrees: readings - 1 })));
  if (!repeats) return { kind: 'tooFew', level: 'repeats' };
  const withinRuns = groups(days, ({ run, board }) => JSON.stringify([board, run]));
  const ofDays = level(withinRuns.map((group) => spread(group.map(({ mean }) => mean))));
  if (!ofDays) return { kind: 'tooFew', level: 'days' };
  const runMeans = withinRuns.map((group) => ({ board: group[0]!.board, mean: meanOf(group.map(({ mean }) => mean)) }));
  const runs = level(groups(runMeans, ({ board }) => board).map((group) => spread(group.map(({ mean }) => mean))));
  return runs ? { kind: 'found', repeats, days: ofDays, runs } : { kind: 'tooFew', level: 'runs' };
}

const spread = (means: number[]): NestedLevel => ({
  deviation: standardDeviation(means) ?? 0,
  degrees: means.length - 1,
});

function level(parts: NestedLevel[]): NestedLevel | null {
  const degrees = parts.map((part) => part.degrees);
  const deviation = pooledDeviation(
    parts.map((part) => part.deviation),
    degrees,
  );
  return deviation === null ? null : { deviation, degrees: degrees.reduce((sum, d) => sum + d, 0) };
}

function groups<T>(items: readonly T[], keyOf: (item: T) => string): T[][] {
  const found = new Map<string, T[]>();
  for (const item of items) found.set(keyOf(item), [...(found.get(keyOf(item)) ?? []), item]);
  return [...found.values()];
}
