import { movingRanges } from '@/lib/statistics/charts/individuals';

/** Moving range of every board, to the measured board before it; null for the first and where nothing was measured. */
export function movingRangeOf(values: readonly (number | null)[]): (number | null)[] {
  const ranges = movingRanges(values.filter((value) => value !== null));
  let i = 0;
  return values.map((value) => (value === null ? null : (ranges[i++] ?? null)));
}
