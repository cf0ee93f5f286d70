/**
 * Where the falling function `above` (an upper tail probability on 0 to Infinity) takes the value `p`, or the rising
 * `below` takes `1 - p`, whichever is the smaller tail. Bisection: the bracket is certain, so it always ends, at
 * neighbouring numbers or at 1e-15 relative.
 */
export function invertTail(
  below: (x: number) => number,
  above: (x: number) => number,
  p: number,
  end = Infinity,
): number {
  if (!(p >= 0 && p <= 1)) throw new RangeError(`A probability of ${p}.`);
  if (p === 0) return 0;
  if (p === 1) return end;
  const tooLow = (x: number) => (p < 0.5 ? below(x) < p : above(x) > 1 - p);
  let high = Math.min(1, end);
  while (high < end && tooLow(high)) high *= 2;
  let low = high;
  while (!tooLow(low) && low > 0) low /= low > 1e-290 ? 4 : Infinity;
  while (high - low > 1e-15 * high) {
    const middle = (low + high) / 2;
    if (middle === low || middle === high) break;
    if (tooLow(middle)) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
