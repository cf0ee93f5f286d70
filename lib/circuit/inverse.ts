import type { BoardDesign } from './board-design';
import { dividerOhms, wiperOfFraction } from './divider';
import { findRoot } from './find-root';
import type { Thresholds } from './thresholds';

/** What two measured points say about a board whose reference is known. */
export interface InferredBoard {
  /** Trimmer fraction from the ground end. */
  wiper: number;
  feedbackOhms: number;
}

export type Inference = ({ kind: 'found' } & InferredBoard) | { kind: 'impossible' };

/**
 * (trip, release) to (wiper, Rf) for a known reference voltage, closed form. With h = Gf/G1 and q = G2/G1:
 * h = (release - trip)/(trip - Vd - VOL), q = (release + VOL h)/Vz - 1 - h. `impossible` when no parts give these points.
 */
export function inferBoard(design: BoardDesign, points: Thresholds, referenceVolts: number): Inference {
  const headroom = points.tripVolts - design.outputDropVolts - design.outputLowVolts;
  const h = (points.releaseVolts - points.tripVolts) / headroom;
  const q = (points.releaseVolts + design.outputLowVolts * h) / referenceVolts - 1 - h;
  if (!(h > 0 && q > 0 && headroom > 0)) return { kind: 'impossible' };
  const fraction = 1 / (1 + q);
  return {
    kind: 'found',
    wiper: wiperOfFraction(design, fraction),
    feedbackOhms: ((1 - fraction) * dividerOhms(design)) / h,
  };
}

/** Wiper for a wanted trip point at a known reference (the node's voltage at that supply); a root of a quadratic. */
export function wiperForTrip(design: BoardDesign, tripVolts: number, referenceVolts: number): number {
  const k = ((tripVolts - referenceVolts - design.outputDropVolts) * dividerOhms(design)) / design.feedbackOhms;
  const sum = k + tripVolts;
  // The smaller root written without cancellation, so that k = 0 needs no case of its own.
  const fraction = (2 * referenceVolts) / (sum + Math.sqrt(sum * sum - 4 * k * referenceVolts));
  return wiperOfFraction(design, fraction);
}

/** Wiper for a wanted release point at a known reference. */
export function wiperForRelease(design: BoardDesign, releaseVolts: number, referenceVolts: number): number {
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
