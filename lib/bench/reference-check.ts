import type { ReferencePoint } from '../contracts/bench-view';
import type { Measurement, RunResult } from '../run/types';
import type { ReferenceCheck } from './types';

/** The reference board's points as a run found them, against the known ones. A point not found has not passed. */
export function compareReference(
  check: ReferenceCheck,
  result: RunResult,
): { passed: boolean; points: ReferencePoint[] } {
  const points = [
    comparePoint('trip-volts', check.tripVolts, check.toleranceVolts, result),
    comparePoint('release-volts', check.releaseVolts, check.toleranceVolts, result),
  ];
  return { passed: result.verdict === 'pass' && points.every((point) => point.passed), points };
}

function comparePoint(
  quantity: ReferencePoint['quantity'],
  knownVolts: number,
  toleranceVolts: number,
  { measurements }: RunResult,
): ReferencePoint {
  const isIt = (m: Measurement) => m.quantity === quantity;
  const measured = measurements.findLast((m) => isIt(m) && m.phase === 'verified') ?? measurements.findLast(isIt);
  const measuredVolts = measured?.value ?? null;
  return {
    quantity,
    knownVolts,
    toleranceVolts,
    measuredVolts,
    passed: measuredVolts !== null && Math.abs(measuredVolts - knownVolts) <= toleranceVolts,
  };
}
