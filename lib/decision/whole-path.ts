import { nextEnabled } from '../sequence/enabled-steps';
import type { Sequence } from '../sequence/step';
import { kindOf } from '../steps/step-kinds';
import type { Measurement } from '../run/types';
import type { StepVisit } from './decide-verdict';
import { verifiedPoints } from './required-measurements';

/**
 * Whether the steps were gone through from the first to the record, each followed by the next one that is run or by the step
 * that its branch names.
 */
export function isWhole(sequence: Sequence, path: readonly StepVisit[]): boolean {
  const { steps } = sequence;
  let expected = nextEnabled(sequence, 0);
  for (const { stepIndex, jumpedTo } of path) {
    const step = steps[stepIndex];
    if (stepIndex !== expected || !step) return false;
    if (jumpedTo === null) {
      expected = nextEnabled(sequence, stepIndex + 1);
      continue;
    }
    if (step.kind !== 'branch' || steps[jumpedTo]?.id !== step.goTo) return false;
    expected = jumpedTo;
  }
  return steps[expected]?.kind === 'record' && nextEnabled(sequence, expected + 1) === steps.length;
}

/**
 * Whether every visit measured and passed what its step has to, and the points were verified after the last visit that may
 * have moved them.
 */
export function isProven(
  { steps }: Sequence,
  path: readonly StepVisit[],
  measurements: readonly Measurement[],
): boolean {
  const visits = path.map(({ stepIndex, measured }, n) => {
    const passed = measurements
      .slice(path[n - 1]?.measured ?? 0, measured)
      .filter((m) => m.stepIndex === stepIndex && m.passed === true);
    const has = ({ quantity, phase }: Pick<Measurement, 'quantity' | 'phase'>) =>
      passed.some((m) => m.quantity === quantity && m.phase === phase);
    return { step: steps[stepIndex]!, has };
  });
  if (!visits.every(({ step, has }) => kindOf(step).required(step).every(has))) return false;
  const moved = visits.findLastIndex(({ step }) => kindOf(step).movesPoints === true);
  return visits.slice(moved + 1).some(({ step, has }) => step.kind === 'verify' && verifiedPoints.every(has));
}
