/**
 * The value below which a share `p` of the population lies, from a sample sorted or not; interpolated at (n - 1) p, the
 * seventh of the nine definitions of Hyndman and Fan (The American Statistician 50, 1996). NaN of none.
 */
export function sampleQuantile(values: readonly number[], p: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return interpolate(sorted, (sorted.length - 1) * p);
}

/** The same at (n + 1) p - 1, their sixth definition, which capability by percentiles uses; never beyond the extremes. */
export function expectedQuantile(values: readonly number[], p: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return interpolate(sorted, Math.min(sorted.length - 1, Math.max(0, (sorted.length + 1) * p - 1)));
}

function interpolate(sorted: readonly number[], position: number): number {
  const i = Math.floor(position);
  const low = sorted[i] ?? NaN;
  return position === i ? low : low + (position - i) * (sorted[i + 1]! - low);
}

export const medianOf = (values: readonly number[]) => sampleQuantile(values, 0.5);
