import { wiperForTrip } from '@/lib/circuit/inverse';
import { referenceAt, softKneeThresholds } from '@/lib/circuit/soft-knee';
import type { BoardType } from '@/lib/contracts/board-type';

/** Trip and release, to the millivolt, of a nominal board trimmed to the middle of the trip limits. */
export function referencePoints({ code, design, limits }: BoardType): { tripVolts: number; releaseVolts: number } {
  const aim = (limits.tripVolts.min + limits.tripVolts.max) / 2;
  const reference = referenceAt(design.reference, aim);
  if (reference.kind !== 'found') throw new Error(`The reference of ${code} has no value at ${aim} V.`);
  const points = softKneeThresholds(design, wiperForTrip(design, aim, reference.x));
  if (points.kind !== 'found') throw new Error(`${code} has no points.`);
  const round = (volts: number) => Math.round(volts * 1000) / 1000;
  return { tripVolts: round(points.tripVolts), releaseVolts: round(points.releaseVolts) };
}
