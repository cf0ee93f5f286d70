import type { Step } from './step';

/** The step with one field changed, such as contactCheck.volts; what it does not touch stays the same object. */
export function setFieldValue(step: Step, field: string, value: unknown): Step {
  return setAt(step, field.split('.'), value) as Step;
}

function setAt(holder: unknown, [key, ...rest]: string[], value: unknown): object {
  const own = (holder ?? {}) as Record<string, unknown>;
  return { ...own, [key!]: rest.length === 0 ? value : setAt(own[key!], rest, value) };
}
