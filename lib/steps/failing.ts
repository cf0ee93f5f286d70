import type { FieldChange, SequenceFinding } from '../sequence/finding';
import type { AnyStep } from './step-common';

type Told = Omit<SequenceFinding, 'stepId' | 'severity' | 'mend'> & Partial<Pick<SequenceFinding, 'mend'>>;

/** A finding where `bad`, else nothing. */
export function failing(
  bad: boolean,
  severity: SequenceFinding['severity'],
  step: AnyStep,
  told: Told,
): SequenceFinding[] {
  return bad ? [{ severity, stepId: step.id, mend: null, ...told }] : [];
}

/** One value put right: "Use 4 ms". */
export function setTo(
  step: AnyStep,
  field: string,
  value: FieldChange['value'],
  text: string,
): NonNullable<SequenceFinding['mend']> {
  return { label: `Use ${text}`, changes: [{ stepId: step.id, field, value }] };
}
