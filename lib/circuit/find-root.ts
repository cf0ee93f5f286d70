export type Root = { kind: 'found'; x: number } | { kind: 'notBracketed' } | { kind: 'notConverged' };

const mostSteps = 200;

/**
 * A zero of `f` between `low` and `high`, where it changes sign, by the Illinois method (regula falsi with the weight of
 * a stale end halved; Dowell and Jarratt 1971). `tolerance` is in units of x.
 */
export function findRoot(f: (x: number) => number, low: number, high: number, tolerance: number): Root {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return { kind: 'found', x: a };
  if (fb === 0) return { kind: 'found', x: b };
  // Signs, not products: a product of tiny values is zero.
  if (Math.sign(fa) * Math.sign(fb) !== -1) return { kind: 'notBracketed' };
  let stale = 0;
  for (let step = 0; step < mostSteps; step++) {
    // Every fourth step halves the bracket, so that flat exponentials cannot stall it.
    const x = step % 4 === 3 ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa);
    const fx = f(x);
    if (fx === 0 || Math.abs(b - a) <= tolerance) return { kind: 'found', x };
    if (Math.sign(fx) !== Math.sign(fb)) {
      [a, fa] = [b, fb];
      stale = 0;
    } else if (++stale > 1) fa /= 2;
    const moved = Math.abs(x - b);
    [b, fb] = [x, fx];
    if (moved <= tolerance && stale === 0) return { kind: 'found', x };
  }
  return { kind: 'notConverged' };
}
