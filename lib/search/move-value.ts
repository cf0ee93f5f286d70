import type { Belief } from './belief';
import { edgeSd, lapseRate } from './grid-posterior';
import { binaryEntropy, normalCdf } from './normal-distribution';

/** What a move is expected to bring. Information in nats. */
export interface MoveValue {
  flipChance: number;
  information: number;
}

const flipOfCell = new Float64Array(512);
const saturated = 3.2;

/**
 * Chance of a flip, and mutual information between the threshold and the answer, of a move from `from` to `to` (fall
 * coordinates), over the belief with its overshoot marginalised: I = H(answer) - E[H(answer | threshold)].
 * Only cells near the edge are visited; the others answer for certain but for lapses.
 */
export function valueMove(belief: Belief, from: number, to: number, noise: number, value: MoveValue): void {
  const { low, cell, cells, overshoots, mass, marginal, cumulative } = belief;
  const toward = Math.max(0, from - to);
  const sd = edgeSd(noise, Math.abs(from - to), cell, 0);
  const deepest = to - overshoots[belief.overshootTo]! * toward;
  const shallowest = to - overshoots[belief.overshootFrom]! * toward;
  const firstPosition = (deepest - saturated * sd - low) / cell - 0.5;
  const lastPosition = (shallowest + saturated * sd - low) / cell - 0.5;
  const first = Math.min(cells, Math.max(0, Math.ceil(firstPosition)));
  const last = Math.max(first - 1, Math.min(cells - 1, Math.floor(lastPosition)));

  const surelyFlips = cumulative[cells]! - cumulative[last + 1]!;
  const surelyStays = cumulative[first]!;
  let flips = surelyFlips * (1 - lapseRate) + surelyStays * lapseRate;
  let conditional = (surelyFlips + surelyStays) * binaryEntropy(lapseRate);

  const dt = cell / sd;
  const oneEdge = shallowest - deepest < 0.3 * sd;
  if (oneEdge) {
    let t = (low + (first + 0.5) * cell - to + belief.overshootMean * toward) / sd;
    for (let i = first; i <= last; i++, t += dt) {
      const flip = lapseRate + (1 - 2 * lapseRate) * normalCdf(t);
      flips += marginal[i]! * flip;
      conditional += marginal[i]! * binaryEntropy(flip);
    }
  } else {
    flipOfCell.fill(0, first, last + 1);
    for (let k = belief.overshootFrom; k <= belief.overshootTo; k++) {
      let t = (low + (first + 0.5) * cell - to + overshoots[k]! * toward) / sd;
      const offset = k * cells;
      for (let i = first; i <= last; i++, t += dt)
        flipOfCell[i]! += mass[offset + i]! * (lapseRate + (1 - 2 * lapseRate) * normalCdf(t));
    }
    for (let i = first; i <= last; i++) {
      const own = marginal[i]!;
      if (own < 1e-9) continue;
      flips += flipOfCell[i]!;
      conditional += own * binaryEntropy(flipOfCell[i]! / own);
    }
  }
  value.flipChance = flips;
  value.information = Math.max(0, binaryEntropy(flips) - conditional);
}

const reached: MoveValue = { flipChance: 0, information: 0 };

/**
 * The furthest level that a move from `from` reaches with at most `chance` of a flip; `from` itself when even a short
 * move is too likely to flip.
 */
export function furthestQuietMove(belief: Belief, from: number, lowest: number, noise: number, chance: number): number {
  valueMove(belief, from, lowest, noise, reached);
  if (reached.flipChance <= chance) return lowest;
  let bad = lowest;
  let good = from;
  for (let i = 0; i < 11; i++) {
    const middle = 0.5 * (bad + good);
    valueMove(belief, from, middle, noise, reached);
    if (reached.flipChance <= chance) good = middle;
    else bad = middle;
  }
  return good;
}
