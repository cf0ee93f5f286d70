import type { BoardDesign } from '../circuit/board-design';
import { wiperForTrip } from '../circuit/inverse';
import { referenceAt, softKneeThresholds } from '../circuit/soft-knee';
import { thresholdsAt, type Thresholds } from '../circuit/thresholds';

/**
 * The points of a design at any wiper fraction, for estimation: where the soft knee has no solution (the reference starves,
 * next to the end stops) the closed form at the nominal reference stands in, so that the function is total. Volts.
 */
export function pointsAt(design: BoardDesign, wiper: number): Thresholds {
  const points = softKneeThresholds(design, wiper);
  return points.kind === 'found' ? points : thresholdsAt(design, wiper, design.reference.nominalVolts);
}

/** The reference node at a supply voltage; the supply itself where the zener does not conduct. */
export function nodeAt(design: BoardDesign, supplyVolts: number): number {
  const node = referenceAt(design.reference, supplyVolts);
  return node.kind === 'found' ? node.x : Math.min(supplyVolts, design.reference.nominalVolts);
}

/** Wiper fraction for a trip point; outside 0 to 1 where the trimmer cannot reach it. */
export function wiperFor(design: BoardDesign, tripVolts: number): number {
  return wiperForTrip(design, tripVolts, nodeAt(design, tripVolts));
}
