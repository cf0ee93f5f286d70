/** Multiplier, quotient, remainder and modulus of the four parts. */
const parts = [
  [11600, 185127, 10379, 2147483579],
  [47003, 45688, 10479, 2147483543],
  [23000, 93368, 19423, 2147483423],
  [33000, 65075, 8123, 2147483123],
] as const;

/**
 * Uniform numbers in [0, 1), same seed, same numbers: the generator that JCGM 101:2008 recommends, C.3.3 (Wichmann and Hill,
 * Computational Statistics & Data Analysis 51, 2006), period 2^121. `seed` is any whole number; the four parts start from it
 * by distinct multiples, and the first numbers, which still show it, are thrown away.
 */
export function wichmannHill(seed: number): () => number {
  const state = Int32Array.from(
    parts,
    ([, , , modulus], i) => (Math.abs(Math.trunc(seed)) * (7 * i + 11) + 104_729 * (i + 1)) % modulus || 1,
  );
  const next = () => {
    let sum = 0;
    for (let i = 0; i < 4; i++) {
      const [multiplier, quotient, remainder, modulus] = parts[i]!;
      const x = state[i]!;
      const moved = multiplier * (x % quotient) - remainder * ((x / quotient) | 0);
      state[i] = moved < 0 ? moved + modulus : moved;
      sum += state[i]! / modulus;
    }
    return sum - Math.floor(sum);
  };
  for (let i = 0; i < 40; i++) next();
  return next;
}
