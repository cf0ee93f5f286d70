import type { Sequence } from '../sequence/step';
import { kindOf } from '../steps/step-kinds';
import type { Required } from '../steps/step-kind';

/** What a verification has to have measured and passed. */
export const verifiedPoints = (['trip-volts', 'release-volts', 'hysteresis-volts'] as const).map(
  (quantity): Required => ({ quantity, phase: 'verified' }),
);

/**
 * What must have been measured, and passed, before a board may pass a sequence that it goes through step by step, with the
 * step it belongs to. Verified points are always among them, so a sequence that verifies nothing passes nothing
 * (`stepIndex` is then null). A branch may leave steps out; then lib/decision/whole-path.ts says what is left.
 */
export function requiredMeasurements({ steps }: Sequence): (Required & { stepIndex: number | null })[] {
  const verifying = steps.findLastIndex((step) => step.enabled && step.kind === 'verify');
  return [
    ...steps.flatMap((step, stepIndex) =>
      step.enabled
        ? kindOf(step)
            .required(step)
            .map((each) => ({ ...each, stepIndex }))
        : [],
    ),
    ...verifiedPoints.map((each) => ({ ...each, stepIndex: verifying < 0 ? null : verifying })),
  ];
}
