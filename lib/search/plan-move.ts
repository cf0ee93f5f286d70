import { type Belief, quantile } from './belief';
import { type MoveValue, furthestQuietMove, valueMove } from './move-value';

/** Settles that a waypoint costs in the score. Tuned by simulation with the two below; the optimum is flat, within 3 %. */
const waypointCost = 1.1;
/** A flip costs the way back, more so when the other threshold needs no more looks. */
const flipCost = 0.7;
const flipCostAlone = 2;
/** Chance of a flip that a waypoint may run. */
const waypointFlipChance = 0.12;
const targets = 22;
const mostWaypoints = 2;

export interface Move {
  /** Level to settle at, fall coordinates. */
  to: number;
  dwell: 'settle' | 'waypoint';
}

const value: MoveValue = { flipChance: 0, information: 0 };

/**
 * The next move of an armed threshold: greedy information per settle, looking ahead over up to two waypoints. Every
 * plan is a chain of waypoints and one probe; only the first move of the best plan is made, then all is planned anew.
 * Levels stay between `lowest` and `highest` (the supply's range and cap).
 */
export function planMove(
  belief: Belief,
  from: number,
  allowed: { lowest: number; highest: number },
  noise: number,
  otherDone: boolean,
): Move {
  const { lowest, highest } = allowed;
  const first = quantile(belief, 0.03) - 1.5 * noise;
  const last = quantile(belief, 0.97) + 1.5 * noise;
  const costOfFlip = otherDone ? flipCostAlone : flipCost;
  const u = belief.overshootMean;
  let start = from;
  let waypoint: number | null = null;
  let bestScore = -1;
  let best: Move = { to: Math.max(lowest, first), dwell: 'settle' };
  for (let waypoints = 0; waypoints <= mostWaypoints; waypoints++) {
    for (let i = 0; i < targets; i++) {
      const reach = first + ((last - first) * i) / (targets - 1);
      const to = Math.min(highest, Math.max(lowest, reach < start ? (reach + u * start) / (1 + u) : reach));
      valueMove(belief, start, to, noise, value);
      const score = value.information / (1 + waypointCost * waypoints + value.flipChance * costOfFlip);
      if (score > bestScore) {
        bestScore = score;
        best = waypoint === null ? { to, dwell: 'settle' } : { to: waypoint, dwell: 'waypoint' };
      }
    }
    const further = furthestQuietMove(belief, start, lowest, noise, waypointFlipChance);
    if (start - further < 1e-3) break;
    waypoint ??= further;
    start = further;
  }
  return best;
}
