import type { BoardType } from '../contracts/board-type';
import type { BoardDesign } from '../circuit/board-design';
import { inferSoftKneeBoard } from '../circuit/inverse';
import { referenceAt } from '../circuit/soft-knee';
import type { Thresholds } from '../circuit/thresholds';
import type { ReferenceReading } from './facts';
import { e24Near } from '../circuit/preferred-values';
import type { LikelyCause, Measurement } from './types';

/**
 * Likely causes by signature, worded as likely and never certain. Null where the signature fits none. Volts.
 */

/** A conducting silicon diode. */
const diodeVolts = { min: 0.4, max: 1.1 };
/** Above this share of the supply the node is not held at all. */
const unheldShare = 0.85;

/** Reference out of limits, read with `supplyVolts` at the board. */
export function causeOfReference(
  referenceVolts: number,
  supplyVolts: number,
  { reference }: BoardDesign,
): LikelyCause | null {
  if (referenceVolts >= diodeVolts.min && referenceVolts <= diodeVolts.max) return 'zener-reversed';
  if (referenceVolts >= unheldShare * supplyVolts) return 'zener-open-or-reversed';
  const expected = referenceAt(reference, supplyVolts);
  if (expected.kind !== 'found') return null;
  // The sag below the rated voltage hardly differs between neighbouring standard values.
  const rated = reference.nominalVolts + (referenceVolts - expected.x);
  const standard = e24Near(rated);
  const isStandard = Math.abs(rated / standard - 1) <= zenerTolerance;
  return isStandard && standard !== e24Near(reference.nominalVolts) ? 'wrong-zener' : null;
}
const zenerTolerance = 0.05;

/** More feedback resistance than this many times the nominal is as good as none. */
const openRatio = 30;
/** Nearer than this to the nominal the resistor fitted is taken to be the right one. An E24 step is 10 %. */
const resistorTolerance = 0.07;

/** Hysteresis that trimming cannot correct: what the two points, and the reference where it was read, say about the feedback resistor. */
export function causeOfHysteresis(
  points: Thresholds,
  read: ReferenceReading | null,
  design: BoardDesign,
): LikelyCause | null {
  const inferred = inferSoftKneeBoard(withReference(design, read), points);
  if (inferred.kind !== 'found') return null;
  const ratio = inferred.feedbackOhms / design.feedbackOhms;
  if (ratio >= openRatio) return 'feedback-open';
  return Math.abs(ratio - 1) > resistorTolerance ? 'wrong-feedback-resistor' : null;
}

/** The design with the zener that gives the reference read. */
function withReference(design: BoardDesign, read: ReferenceReading | null): BoardDesign {
  const expected = read && referenceAt(design.reference, read.supplyVolts);
  if (expected?.kind !== 'found') return design;
  const nominalVolts = design.reference.nominalVolts + read!.volts - expected.x;
  return { ...design, reference: { ...design.reference, nominalVolts } };
}

/** A verified value out of limits, seen with the other verified values. */
export function causeOfVerified(
  failed: Measurement,
  measurements: readonly Measurement[],
  read: ReferenceReading | null,
  { design }: BoardType,
): LikelyCause | null {
  if (failed.quantity === 'trip-spread-volts') return 'noisy-wiper-or-contact';
  if (failed.quantity === 'trip-volts') return null;
  const valueOf = (quantity: Measurement['quantity']) => measurements.find((m) => m.quantity === quantity)?.value;
  const tripVolts = valueOf('trip-volts');
  const releaseVolts = valueOf('release-volts');
  if (tripVolts === undefined || releaseVolts === undefined) return null;
  return causeOfHysteresis({ tripVolts, releaseVolts }, read, design);
}
