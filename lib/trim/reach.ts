import type { BoardDesign } from '../circuit/board-design';
import { findRoot } from '../circuit/find-root';
import type { BoardLimits } from '../contracts/board-type';
import type { RejectReason } from '../run/types';
import { designOf, estimateBoard } from './board-estimate';
import { pointsAt, wiperFor } from './board-model';
import type { FoundPoints, TrimSettings } from './types';

export type PointLimits = Pick<BoardLimits, 'tripVolts' | 'releaseVolts' | 'hysteresisVolts'>;

export type ReachReason = Extract<
  RejectReason,
  | 'trip-too-low'
  | 'trip-too-high'
  | 'release-too-low'
  | 'release-too-high'
  | 'hysteresis-too-small'
  | 'hysteresis-too-large'
>;

export type TrimReach =
  | { reachable: true }
  | {
      reachable: false;
      finding: 'cannot-reach-limits';
      /** The limit that fails at the best setting, what would be measured there, and the limit. Volts. */
      reason: ReachReason;
      bestVolts: number;
      limitVolts: number;
    };

/** Settings looked at between those that put the trip point on its limits. */
const settingsTried = 60;
/** The estimate's doubt of the reference that a rejection has to survive, in standard deviations. */
const doubts = [0, -2, 2];
/** Doubt of the parts that the points do not show, such as the output's drop. */
const leastMarginVolts = 0.005;

/**
 * Whether any setting of the trimmer meets the limits of trip, release and hysteresis together: both points move with it,
 * and the hysteresis scales. From the points found, and the reference where it was read. A board is out of reach only when
 * it is by more than the margin, for every reference the doubt allows.
 */
export function canTrimReach(settings: TrimSettings, found: FoundPoints, limits: PointLimits): TrimReach {
  const margin = Math.max(leastMarginVolts, 3 * found.tripUncertaintyVolts);
  const { mean, covariance } = estimateBoard(settings, found);
  const referenceSd = Math.sqrt(covariance[1]![1]!);
  let asEstimated: TrimReach = { reachable: true };
  for (const doubt of doubts) {
    const design = designOf([mean[0]!, mean[1]! + doubt * referenceSd, ...mean.slice(2)], settings);
    const reach = reachOf(withHysteresis(design, found), limits, margin);
    if (reach.reachable) return reach;
    if (doubt === 0) asEstimated = reach;
  }
  return asEstimated;
}

/** The design with the feedback resistor that gives the hysteresis found. */
function withHysteresis(design: BoardDesign, found: FoundPoints): BoardDesign {
  const changed = (ln: number): BoardDesign => ({ ...design, feedbackOhms: design.feedbackOhms * Math.exp(ln) });
  const releaseOf = (ln: number) => {
    const board = changed(ln);
    return pointsAt(board, inside(wiperFor(board, found.tripVolts))).releaseVolts;
  };
  const most = Math.log(100);
  const root = findRoot((ln) => releaseOf(ln) - found.releaseVolts, -most, most, 1e-9);
  if (root.kind === 'found') return changed(root.x);
  // No feedback to speak of, or far too much of it.
  return changed(releaseOf(most) > found.releaseVolts ? most : -most);
}

function reachOf(board: BoardDesign, limits: PointLimits, margin: number): TrimReach {
  const low = pointsAt(board, inside(1)).tripVolts;
  const high = pointsAt(board, inside(0)).tripVolts;
  const { min, max } = limits.tripVolts;
  if (low > max + margin) return outOfReach('trip-too-high', low, max);
  if (high < min - margin) return outOfReach('trip-too-low', high, min);

  let best: { excess: number; miss: TrimReach } | null = null;
  const from = inside(wiperFor(board, max));
  const to = inside(wiperFor(board, min));
  for (let i = 0; i <= settingsTried; i++) {
    const miss = missAt(board, from + ((to - from) * i) / settingsTried, limits);
    if (miss.excess <= margin) return { reachable: true };
    if (!best || miss.excess < best.excess) best = miss;
  }
  return best!.miss;
}

/** The limit of release or hysteresis that fails by most at one setting; hysteresis first, since no setting corrects it. */
function missAt(board: BoardDesign, wiper: number, limits: PointLimits): { excess: number; miss: TrimReach } {
  const { tripVolts, releaseVolts } = pointsAt(board, wiper);
  const hysteresis = releaseVolts - tripVolts;
  const checks: [ReachReason, number, number, number][] = [
    ['hysteresis-too-large', hysteresis - limits.hysteresisVolts.max, hysteresis, limits.hysteresisVolts.max],
    ['hysteresis-too-small', limits.hysteresisVolts.min - hysteresis, hysteresis, limits.hysteresisVolts.min],
    ['release-too-high', releaseVolts - limits.releaseVolts.max, releaseVolts, limits.releaseVolts.max],
    ['release-too-low', limits.releaseVolts.min - releaseVolts, releaseVolts, limits.releaseVolts.min],
  ];
  const excess = Math.max(...checks.map((check) => check[1]));
  const [reason, , bestVolts, limitVolts] = checks.find((check) => check[1] >= 0.8 * excess) ?? checks[0]!;
  return { excess, miss: outOfReach(reason, bestVolts, limitVolts) };
}

const outOfReach = (reason: ReachReason, bestVolts: number, limitVolts: number): TrimReach => ({
  reachable: false,
  finding: 'cannot-reach-limits',
  reason,
  bestVolts,
  limitVolts,
});

const inside = (wiper: number) => Math.min(0.9999, Math.max(0.0001, wiper));
