import type { FieldChange } from '@/lib/sequence/finding';
import type { Sequence, Step, StepKind } from '@/lib/sequence/step';

/** A sequence with values put in by their paths, as a mend does. */
export function applied(sequence: Sequence, changes: readonly FieldChange[]): Sequence {
  return {
    ...sequence,
    steps: sequence.steps.map((step) =>
      changes.filter(({ stepId }) => stepId === step.id).reduce((s, { field, value }) => put(s, field, value), step),
    ),
  };
}

function put(step: Step, field: string, value: FieldChange['value']): Step {
  const copy = structuredClone(step) as unknown as Record<string, unknown>;
  const names = field.split('.');
  const last = names.pop()!;
  const holder = names.reduce((object, name) => object[name] as Record<string, unknown>, copy);
  holder[last] = value;
  return copy as unknown as Step;
}

export function changed(sequence: Sequence, kind: StepKind, over: object): Sequence {
  return { ...sequence, steps: sequence.steps.map((s) => (s.kind === kind ? ({ ...s, ...over } as Step) : s)) };
}

export function without(sequence: Sequence, ...kinds: StepKind[]): Sequence {
  return { ...sequence, steps: sequence.steps.filter((s) => !kinds.includes(s.kind)) };
}

/** Steps put in before the first of `kind`. */
export function before(sequence: Sequence, kind: StepKind, ...steps: Step[]): Sequence {
  const at = sequence.steps.findIndex((s) => s.kind === kind);
  return { ...sequence, steps: [...sequence.steps.slice(0, at), ...steps, ...sequence.steps.slice(at)] };
}
