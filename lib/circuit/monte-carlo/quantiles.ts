/**
 * As sampleQuantile (lib/statistics), for many numbers and several shares at once: typed arrays sort by value twenty times
 * faster. NaN counts as largest.
 */
export function quantilesOf(values: Float64Array, shares: readonly number[]): number[] {
  const sorted = values.slice().sort();
  return shares.map((share) => {
    const at = share * (sorted.length - 1);
    const low = Math.floor(at);
    const below = sorted[low] ?? NaN;
    return at === low ? below : below + (at - low) * (sorted[low + 1]! - below);
  });
}
