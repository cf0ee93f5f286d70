import type { BoardDesign } from './board-design';
import { dividerOhms, wiperOfFraction } from './divider';
import { findRoot } from './find-root';
import { referenceAt } from './soft-knee';
import type { Thresholds } from './thresholds';

/** What two measured points say about a board whose reference is known. */
export interface InferredBoard {
  /** Trimmer fraction from the ground end. */
  wiper: number;
  feedbackOhms: number;
}

export type Inference = ({ kind: 'found' } & InferredBoard) | { kind: 'impossible' };

/**
 * (trip, release) to (wiper, Rf), closed form, for known reference voltages at the two points; they are one and the same
 * for an ideal zener. With h = Gf/G1, q = G2/G1, VT and VR the references:
 * h = (VT/VR release - trip) / (trip - Vd - VOL VT/VR), q = (release + VOL h)/VR - 1 - h.
 * `impossible` when no parts give these points.
 */
export function inferBoard(
  design: BoardDesign,
  { tripVolts, releaseVolts }: Thresholds,
  nodeAtTripVolts: number,
  nodeAtReleaseVolts = nodeAtTripVolts,
): Inference {
  const { comparatorOffsetVolts = 0 } = design;
  const atTripVolts = nodeAtTripVolts + comparatorOffsetVolts;
  const atReleaseVolts = nodeAtReleaseVolts + comparatorOffsetVolts;
  const sag = atTripVolts / atReleaseVolts;
  const headroom = tripVolts - design.outputDropVolts - design.outputLowVolts * sag;
  const h = (sag * releaseVolts - tripVolts) / headroom;
  const q = (releaseVolts + design.outputLowVolts * h) / atReleaseVolts - 1 - h;
  if (!(h > 0 && q > 0 && headroom > 0)) return { kind: 'impossible' };
  const fraction = 1 / (1 + q);
  return {
    kind: 'found',
    wiper: wiperOfFraction(design, fraction),
    feedbackOhms: ((1 - fraction) * dividerOhms(design)) / h,
  };
}

/** The same with the design's soft-knee reference, which sags between the two points. */
export function inferSoftKneeBoard(design: BoardDesign, points: Thresholds): Inference {
  const atTrip = referenceAt(design.reference, points.tripVolts);
  const atRelease = referenceAt(design.reference, points.releaseVolts);
  if (atTrip.kind !== 'found' || atRelease.kind !== 'found') return { kind: 'impossible' };
  return inferBoard(design, points, atTrip.x, atRelease.x);
}

/** Wiper for a wanted trip point at a known reference (the node's voltage at that supply); a root of a quadratic. */
export function wiperForTrip(design: BoardDesign, tripVolts: number, nodeVolts: number): number {
  const referenceVolts = nodeVolts + (design.comparatorOffsetVolts ?? 0);
  const k = ((tripVolts - referenceVolts - design.outputDropVolts) * dividerOhms(design)) / design.feedbackOhms;
  const sum = k + tripVolts;
  // The smaller root written without cancellation, so that k = 0 needs no case of its own.
  const fraction = (2 * referenceVolts) / (sum + Math.sqrt(sum * sum - 4 * k * referenceVolts));
  return wiperOfFraction(design, fraction);
}

/** Wiper for a wanted release point at a known reference. */
export function wiperForRelease(design: BoardDesign, releaseVolts: number, nodeVolts: number): number {
  const referenceVolts = nodeVolts + (design.comparatorOffsetVolts ?? 0);
  const m = ((referenceVolts - design.outputLowVolts) * dividerOhms(design)) / design.feedbackOhms;
  const sum = releaseVolts - m;
  const fraction = (2 * referenceVolts) / (sum + Math.sqrt(sum * sum + 4 * m * referenceVolts));
  return wiperOfFraction(design, fraction);
}

/**
 * The reference voltage, from the points at two settings of one trimmer: the one for which both give the same Rf.
 * Ill-conditioned: 2 mV in one reading moves it by 40 to 70 mV.
 */
export function inferReference(
  design: BoardDesign,
  first: Thresholds,
  second: Thresholds,
  between: { minVolts: number; maxVolts: number },
): { kind: 'found'; referenceVolts: number } | { kind: 'notBracketed' } | { kind: 'notConverged' } {
  const feedbackOf = (points: Thresholds, referenceVolts: number) => {
    const inferred = inferBoard(design, points, referenceVolts);
    return inferred.kind === 'found' ? inferred.feedbackOhms : NaN;
  };
  const root = findRoot(
    (volts) => feedbackOf(first, volts) / feedbackOf(second, volts) - 1,
    between.minVolts,
    between.maxVolts,
    1e-10,
  );
  return root.kind === 'found' ? { kind: 'found', referenceVolts: root.x } : root;
}
