import type { ReferencePoint } from '../contracts/bench-view';
import type { BoardType } from '../contracts/board-type';
import type { Measurement, RunPlan, RunResult } from '../run/types';
import type { Sequence, Step } from '../sequence/step';
import type { ReferenceCheck } from './types';

/**
 * The daily check as a run: seat, power up, find the points once, supply off. Its limits are the known points of the
 * reference board, which nobody trims. Currents, windows and settling are those of the type's released sequence.
 */
export function planReferenceCheck(
  { tripVolts, releaseVolts, toleranceVolts }: ReferenceCheck,
  boardType: BoardType,
  { steps }: Sequence,
): Pick<RunPlan, 'boardType' | 'sequence'> {
  const around = (volts: number, tolerance: number) => ({ min: volts - tolerance, max: volts + tolerance });
  const kept = (kind: Step['kind']) => steps.filter((step) => step.kind === kind && step.enabled).slice(0, 1);
  const verify = kept('verify').map((step) => ({ ...step, repeats: 1 }) as Step);
  return {
    boardType: {
      ...boardType,
      limits: {
        ...boardType.limits,
        tripVolts: around(tripVolts, toleranceVolts),
        releaseVolts: around(releaseVolts, toleranceVolts),
        hysteresisVolts: around(releaseVolts - tripVolts, 2 * toleranceVolts),
      },
    },
    sequence: {
      decisionRule: { kind: 'simple' },
      steps: [...kept('seat'), ...kept('power-up'), ...verify, ...kept('record')],
    },
  };
}

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
