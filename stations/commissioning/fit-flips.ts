import { normalCdf } from '@/lib/search/normal-distribution';

/** One probe of a point: by how much it lay on the flipping side of some origin, and whether the output flipped. */
export interface Flip {
  at: number;
  flipped: boolean;
}

export interface FlipFit {
  /** Where half of the probes flip. */
  centre: number;
  /** Standard deviation of the point from probe to probe. */
  scatter: number;
}

const gridSize = 121;
const scatterSteps = 40;
const lapse = 0.005;

/**
 * Maximum likelihood of a probit response, P(flip) = Phi((at - centre) / scatter), over a grid between the ends given;
 * null when all probes answered alike. Same unit in and out. `scatters`: smallest and largest tried.
 */
export function fitFlips(flips: readonly Flip[], scatters: { least: number; most: number }): FlipFit | null {
  const flipped = flips.filter((flip) => flip.flipped).map((flip) => flip.at);
  const stayed = flips.filter((flip) => !flip.flipped).map((flip) => flip.at);
  if (flipped.length === 0 || stayed.length === 0) return null;
  const low = Math.min(...flipped, Math.max(...stayed)) - scatters.least;
  const high = Math.max(...stayed, Math.min(...flipped)) + scatters.least;
  let best: FlipFit & { likelihood: number } = { centre: NaN, scatter: NaN, likelihood: -Infinity };
  for (let j = 0; j < scatterSteps; j++) {
    const scatter = scatters.least * (scatters.most / scatters.least) ** (j / (scatterSteps - 1));
    for (let i = 0; i < gridSize; i++) {
      const centre = low + ((high - low) * i) / (gridSize - 1);
      let likelihood = 0;
      for (const { at, flipped: hit } of flips) {
        const p = lapse + (1 - 2 * lapse) * normalCdf((at - centre) / scatter);
        likelihood += Math.log(hit ? p : 1 - p);
      }
      if (likelihood > best.likelihood) best = { centre, scatter, likelihood };
    }
  }
  return best;
}
