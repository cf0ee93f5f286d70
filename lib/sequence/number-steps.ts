import type { Step } from './step';

type Unnumbered<S> = S extends Step ? Omit<S, 'id' | 'name' | 'enabled'> : never;

/** Steps written by hand, given ids by their place, the name of their kind, and all of them run. */
export function numberSteps(steps: readonly Unnumbered<Step>[]): Step[] {
  return steps.map((step, index) => ({ id: `s${index + 1}`, name: '', enabled: true, ...step }) as Step);
}
