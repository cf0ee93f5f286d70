import type { Sequence } from '../sequence/step';
import { kindOf } from '../steps/step-kinds';
import type { Required } from '../steps/step-kind';

const points = ['trip-volts', 'release-volts', 'hysteresis-volts'] as const;

/**
 * What must have been measured, and passed, before a board may pass this sequence, with the step it belongs to. Verified
 * points are always among them, so a sequence that verifies nothing passes nothing (`stepIndex` is then null).
 */
export function requiredMeasurements(sequence: Sequence): (Required & { stepIndex: number | null })[] {
  const verifying = sequence.steps.findLastIndex((step) => step.kind === 'verify');
  const verified = points.map((quantity) => ({
    quantity,
    phase: 'verified' as const,
    stepIndex: verifying < 0 ? null : verifying,
  }));
  return [
    ...sequence.steps.flatMap((step, stepIndex) =>
      kindOf(step)
        .required(step)
        .map((each) => ({ ...each, stepIndex })),
    ),
    ...verified,
  ];
}
