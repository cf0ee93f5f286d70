import type { Step, StepKind, StepOf } from './step';

interface Steps {
  steps: readonly Step[];
}

/** Index of the first step from `from` on that is run; the number of steps when none is. */
export function nextEnabled({ steps }: Steps, from: number): number {
  const index = steps.findIndex((step, i) => i >= from && step.enabled);
  return index < 0 ? steps.length : index;
}

/** The first step of a kind that is run; null when there is none. */
export function firstOf<K extends StepKind>({ steps }: Steps, kind: K): StepOf<K> | null {
  const isWanted = (step: Step): step is StepOf<K> => step.kind === kind && step.enabled;
  return steps.find(isWanted) ?? null;
}
