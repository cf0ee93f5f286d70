import { wiperAt } from '@/lib/circuit/trimmer';
import { softKneeThresholds } from '@/lib/circuit/soft-knee';
import type { BoardType } from '@/lib/contracts/board-type';
import { firstOf } from '@/lib/sequence/enabled-steps';
import type { Sequence } from '@/lib/sequence/step';
import { voltsOnReservoir } from '../simulation/board-feed';
import type { BoardTruth } from '../simulation/board-truth';
import { SimulatedBoard } from '../simulation/simulated-board';

const inside = (value: number, { min = -Infinity, max = Infinity }: { min?: number; max?: number }) =>
  value >= min && value <= max;

/** Whether the board as its screw stands is truly inside every limit of its type: known to the simulation only. */
export function isTrulyGood(board: SimulatedBoard, boardType: BoardType, sequence: Sequence): boolean {
  const { truth } = board;
  const { limits, search } = boardType;
  const { tripVolts, releaseVolts } = board.thresholds();
  if (!inside(tripVolts, limits.tripVolts) || !inside(releaseVolts, limits.releaseVolts)) return false;
  if (!inside(releaseVolts - tripVolts, limits.hysteresisVolts)) return false;
  // A worn wiper stands inside its limits now and outside them a moment later.
  if (truth.output !== 'works' || truth.shortOhms !== null || truth.wiperJumpVolts > 0) return false;
  const referenceAt = firstOf(sequence, 'reference')?.atVolts ?? tripVolts;
  if (!inside(board.referenceVolts(referenceAt), limits.referenceVolts)) return false;
  const { design } = truth;
  if (!inside(design.outputDropVolts, limits.outputHighDropVolts)) return false;
  if (!inside(board.outputVolts(search.supplyMinVolts, false), limits.outputLowVolts)) return false;
  const between = (tripVolts + releaseVolts) / 2;
  if (!inside(board.amps(between, false), limits.quiescentAmps)) return false;
  const heldAt = firstOf(sequence, 'ride-through')?.atVolts ?? between;
  const afterPulse = voltsOnReservoir(
    { board, contactOhms: 0, on: true },
    heldAt,
    limits.rideThroughSeconds.min * 1000,
  );
  return afterPulse > tripVolts;
}

/** Whether some place of the screw would bring the board inside every limit, so that rejecting it before its trim was done loses a good board. */
export function couldBeGood(truth: BoardTruth, boardType: BoardType, sequence: Sequence): boolean {
  if (!truth.wiperFollows) return isTrulyGood(new SimulatedBoard(truth), boardType, sequence);
  const { minTurns, maxTurns } = truth.stops;
  const trips = (turns: number) => {
    const points = softKneeThresholds(truth.design, wiperAt(truth.trimmer, turns));
    return points.kind === 'found' ? points.tripVolts : null;
  };
  const { min, max } = boardType.limits.tripVolts;
  for (let i = 0; i <= places; i++) {
    const wanted = min + ((max - min) * i) / places;
    const turns = turnsFor(trips, wanted, minTurns, maxTurns);
    if (turns === null) continue;
    if (isTrulyGood(new SimulatedBoard({ ...truth, screwTurns: turns }), boardType, sequence)) return true;
  }
  return false;
}
const places = 8;

/** The trip point is monotone in the screw; null where its ends do not enclose it. */
function turnsFor(trips: (turns: number) => number | null, wanted: number, from: number, to: number): number | null {
  let [low, high] = [from, to];
  const [atLow, atHigh] = [trips(low), trips(high)];
  if (atLow === null || atHigh === null || (atLow - wanted) * (atHigh - wanted) > 0) return null;
  const rises = atHigh > atLow;
  for (let i = 0; i < 40; i++) {
    const middle = (low + high) / 2;
    const trip = trips(middle);
    if (trip === null) return null;
    if (trip < wanted === rises) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
