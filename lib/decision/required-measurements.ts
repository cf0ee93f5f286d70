import type { Measurement } from '../run/types';
import type { Sequence, Step } from '../sequence/step';

type Required = Pick<Measurement, 'quantity' | 'phase'>;

const check = (...quantities: Measurement['quantity'][]): Required[] =>
  quantities.map((quantity) => ({ quantity, phase: 'check' }));
const verified = (...quantities: Measurement['quantity'][]): Required[] =>
  quantities.map((quantity) => ({ quantity, phase: 'verified' }));

function ofStep(step: Step): Required[] {
  switch (step.kind) {
    case 'seat':
    case 'seal':
      return check('contact-milliohms');
    case 'power-up':
      return check('supply-amps');
    case 'reference':
      return check('reference-volts');
    case 'verify':
      return verified(...(step.repeats > 1 ? (['trip-spread-volts'] as const) : []));
    case 'output-levels':
      return check('output-high-drop-volts', 'output-low-volts');
    case 'quiescent-current':
      return check('quiescent-amps');
    case 'ride-through':
      return check('ride-through-seconds');
    case 'operator-check':
      return check('operator-check');
    case 'find-points':
    case 'trim':
    case 'record':
      return [];
  }
}

/**
 * What must have been measured, and passed, before a board may pass this sequence, with the step it belongs to. Verified
 * points are always among them, so a sequence that verifies nothing passes nothing (`stepIndex` is then null).
 */
export function requiredMeasurements(sequence: Sequence): (Required & { stepIndex: number | null })[] {
  const verifying = sequence.steps.findLastIndex((step) => step.kind === 'verify');
  const points = verified('trip-volts', 'release-volts', 'hysteresis-volts').map((required) => ({
    ...required,
    stepIndex: verifying < 0 ? null : verifying,
  }));
  return [...sequence.steps.flatMap((step, stepIndex) => ofStep(step).map((r) => ({ ...r, stepIndex }))), ...points];
}
