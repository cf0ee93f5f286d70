import type { Step } from './step';

/** The stored value of a field of a step, such as contactCheck.volts; undefined where the step has none. */
export function fieldValue(step: Step, field: string): unknown {
  return field
    .split('.')
    .reduce<unknown>(
      (value, key) =>
        value !== null && typeof value === 'object' ? (value as Record<string, unknown>)[key] : undefined,
      step,
    );
}

/** Every field of a step that holds a single value, beside those that all steps have. */
export function fieldsOf(step: Step): string[] {
  const own = Object.entries(step).filter(([key]) => !['id', 'kind', 'name', 'enabled'].includes(key));
  return own.flatMap(([key, value]) => leaves(key, value));
}

function leaves(path: string, value: unknown): string[] {
  if (value === null || typeof value !== 'object' || Array.isArray(value)) return [path];
  return Object.entries(value).flatMap(([key, each]) => leaves(`${path}.${key}`, each));
}
