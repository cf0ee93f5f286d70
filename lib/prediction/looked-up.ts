import { firstOf } from '../sequence/enabled-steps';
import type { Sequence, Step, StepKind } from '../sequence/step';

/** A value that a step read in the first step of another kind, as text. */
export interface LookedUp {
  kind: StepKind;
  field: string;
  text: string;
}

const telling = new Set(['kind', 'enabled', 'id']);

/** The same sequence, noting which fields of its steps are read through `firstOf`; those that only tell steps apart do not count. */
export function watchedSequence(sequence: Sequence): { sequence: Sequence; lookedUp: LookedUp[] } {
  const lookedUp: LookedUp[] = [];
  const steps = sequence.steps.map(
    (step) =>
      new Proxy(step, {
        get(target, field: keyof Step) {
          const value = target[field];
          if (!telling.has(field) && !lookedUp.some((each) => each.kind === step.kind && each.field === field)) {
            lookedUp.push({ kind: step.kind, field, text: JSON.stringify(value) });
          }
          return value;
        },
      }),
  );
  return { sequence: { ...sequence, steps }, lookedUp };
}

/** Whether all that was read reads the same in another draft. */
export function readsTheSame(sequence: Sequence, lookedUp: readonly LookedUp[]): boolean {
  return lookedUp.every(({ kind, field, text }) => {
    const step = firstOf(sequence, kind);
    return step !== null && JSON.stringify(step[field as keyof typeof step]) === text;
  });
}
