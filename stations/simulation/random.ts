export interface Random {
  /** Uniform in [0, 1). */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  between(low: number, high: number): number;
  pick<T>(items: readonly T[]): T;
}

/** Same seed, same sequence: sfc32 (Doty-Humphrey, PractRand), seeded through a few rounds; normals by Box and Muller. */
export function seededRandom(seed: number): Random {
  let a = seed | 0;
  let b = Math.floor(seed / 2 ** 32) | 0;
  let c = 0x9e3779b9 | 0;
  let counter = 1;
  const next = () => {
    const t = (((a + b) | 0) + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (((c << 21) | (c >>> 11)) + t) | 0;
    return (t >>> 0) / 2 ** 32;
  };
  for (let round = 0; round < 15; round++) next();
  let spare: number | null = null;
  const normal = () => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - next()));
    const angle = 2 * Math.PI * next();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
  return {
    uniform: next,
    normal,
    between: (low, high) => low + (high - low) * next(),
    pick: (items) => items[Math.floor(next() * items.length)]!,
  };
}

/** A seed for a text such as a serial number: FNV-1a, 32 bit. */
export function seedOf(text: string): number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < text.length; i++) hash = Math.imul(hash ^ text.charCodeAt(i), 0x01000193);
  return hash >>> 0;
}
