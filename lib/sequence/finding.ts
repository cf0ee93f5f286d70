/** One value of a draft put right. `field` is a path such as contactCheck.volts. */
export interface FieldChange {
  stepId: string;
  field: string;
  value: string | number | boolean | null;
}

/** What the rules say of a sequence. An error keeps it from being released; a warning needs a reason that is kept with the revision. */
export interface SequenceFinding {
  problem: string;
  severity: 'error' | 'warning';
  /** Null: of the whole sequence, such as a step that is missing. */
  stepId: string | null;
  /** The field that the message stands under; null: the step. */
  field: string | null;
  /** What is wrong, then what holds, with its numbers: "2 ms is too short. The output needs 3.6 ms to settle." */
  sentence: string;
  /** One tap that puts it right; null where no single value does. */
  mend: { label: string; changes: FieldChange[] } | null;
}

/** Names a warning from draft to draft, so that a reason given for it stays with it. */
export function findingKey({ problem, stepId, field }: SequenceFinding): string {
  return [problem, stepId ?? '', field ?? ''].join(':');
}
