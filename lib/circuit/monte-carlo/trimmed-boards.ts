import type { BoardType } from '../../contracts/board-type';
import { wiperForTrip } from '../inverse';
import { supplyForReference } from '../soft-knee';
import { boardsOf } from './boards';
import { nodeAt, nodesNear } from './node-voltage';
import { judgedQuantities, type JudgedQuantity, type Misses } from './types';

/** Boards of a type once each is trimmed to the same trip point; only those whose travel reaches it have values. */
export interface TrimmedBoards {
  boards: number;
  targetVolts: number;
  releaseVolts: Float64Array;
  referenceVolts: Float64Array;
  misses: Record<JudgedQuantity, Misses>;
  /** Share of the boards that miss anything. */
  cannotPass: number;
}

/** `boards`: only so many of them, for a quick look. */
export function trimBoards(
  boardType: Pick<BoardType, 'design' | 'tolerances' | 'limits'>,
  targetVolts: number,
  deviations: Float64Array,
  boards?: number,
): TrimmedBoards {
  const { limits } = boardType;
  const releases: number[] = [];
  const references: number[] = [];
  const counts = Object.fromEntries(judgedQuantities.map((each) => [each, { below: 0, above: 0 }])) as Record<
    JudgedQuantity,
    Misses
  >;
  let failing = 0;
  let drawn = 0;
  const misses = (quantity: JudgedQuantity, value: number, { min, max }: { min: number; max: number }) => {
    if (value >= min && value <= max) return false;
    counts[quantity][value < min ? 'below' : 'above']++;
    return true;
  };
  for (const parts of boardsOf(boardType, deviations, boards)) {
    drawn++;
    const node = nodeAt(parts.reference, targetVolts);
    const wiper = wiperForTrip(parts, targetVolts, node);
    // Below 0: even the highest trip point of the travel lies below the target.
    if (misses('target', wiper, { min: 0, max: 1 })) {
      failing++;
      continue;
    }
    const release = supplyForReference(parts.reference, nodesNear(parts, wiper, node, node).release);
    releases.push(release);
    references.push(node);
    const missed = [
      misses('release', release, limits.releaseVolts),
      misses('hysteresis', release - targetVolts, limits.hysteresisVolts),
      misses('reference', node, limits.referenceVolts),
    ];
    if (missed.includes(true)) failing++;
  }
  for (const each of judgedQuantities) {
    counts[each] = { below: counts[each].below / drawn, above: counts[each].above / drawn };
  }
  return {
    boards: drawn,
    targetVolts,
    releaseVolts: Float64Array.from(releases),
    referenceVolts: Float64Array.from(references),
    misses: counts,
    cannotPass: failing / drawn,
  };
}

/** Bins of a round width, at least about 30 over the boards; the limits lie between bins where they are round too. */
export function histogramOf(volts: Float64Array): { fromVolts: number; binVolts: number; counts: number[] } {
  if (volts.length === 0) return { fromVolts: 0, binVolts: 0.01, counts: [] };
  let low = Infinity;
  let high = -Infinity;
  for (const value of volts) {
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  const binVolts = roundWidths.find((width) => (high - low) / width <= mostBins) ?? roundWidths.at(-1)!;
  const first = Math.floor(low / binVolts);
  const counts = new Array<number>(Math.floor(high / binVolts) - first + 1).fill(0);
  for (const value of volts) counts[Math.floor(value / binVolts) - first]!++;
  return { fromVolts: first * binVolts, binVolts, counts };
}
const mostBins = 45;
const roundWidths = [0.001, 0.002, 0.005, 0.01, 0.02, 0.05, 0.1, 0.2, 0.5, 1];
