/** A small seeded generator for simulations: mulberry32, with normal deviates by Box and Muller. */
export interface Random {
  uniform(from: number, to: number): number;
  normal(mean: number, sd: number): number;
}

export function seededRandom(seed: number): Random {
  let state = seed >>> 0;
  const next = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
  return {
    uniform: (from, to) => from + (to - from) * next(),
    normal: (mean, sd) => {
      const radius = Math.sqrt(-2 * Math.log(1 - next()));
      return mean + sd * radius * Math.cos(2 * Math.PI * next());
    },
  };
}
