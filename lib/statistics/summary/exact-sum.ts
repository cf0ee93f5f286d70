/**
 * Sum of `values` as if in unlimited precision, rounded once at the end but for one unit in the last place. Growing
 * expansions of J. R. Shewchuk (Discrete & Computational Geometry 18, 1997), so sums of a million readings lose nothing.
 */
export function exactSum(values: Iterable<number>): number {
  const parts: number[] = [];
  for (const value of values) {
    let x = value;
    let kept = 0;
    for (let y of parts) {
      if (Math.abs(x) < Math.abs(y)) [x, y] = [y, x];
      const high = x + y;
      const low = y - (high - x);
      if (low !== 0) parts[kept++] = low;
      x = high;
    }
    parts.length = kept;
    parts.push(x);
  }
  return parts.reduceRight((sum, part) => sum + part, 0);
}
