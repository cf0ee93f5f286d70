import type { Sequence, Step } from '../sequence/step';

/** A draft in which one step alone (or the rule of decision, or the order) differs from the released revision. */
export interface SingleChange {
  kind: 'changed' | 'added' | 'removed' | 'order' | 'rule';
  stepIds: string[];
  sequence: Sequence;
}

/** Beyond so many, changes are not run alone. */
export const mostSingleChanges = 8;

const same = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

/** Every change of a draft made alone to the released revision, step by step. Empty where there is one only: that is the draft. */
export function singleChanges(released: Sequence, draft: Sequence): SingleChange[] {
  const before = new Map(released.steps.map((step) => [step.id, step]));
  const after = new Map(draft.steps.map((step) => [step.id, step]));
  const changes: SingleChange[] = [];
  const withSteps = (steps: Step[]): Sequence => ({ ...released, steps });

  for (const step of draft.steps) {
    const was = before.get(step.id);
    if (!was)
      changes.push({
        kind: 'added',
        stepIds: [step.id],
        sequence: withSteps(inserted(released.steps, draft.steps, step)),
      });
    else if (!same({ ...was, name: '' }, { ...step, name: '' })) {
      const steps = released.steps.map((each) => (each.id === step.id ? step : each));
      changes.push({ kind: 'changed', stepIds: [step.id], sequence: withSteps(steps) });
    }
  }
  for (const step of released.steps) {
    if (after.has(step.id)) continue;
    const steps = released.steps.filter(({ id }) => id !== step.id);
    changes.push({ kind: 'removed', stepIds: [step.id], sequence: withSteps(steps) });
  }
  const common = draft.steps.filter(({ id }) => before.has(id)).map(({ id }) => id);
  const earlier = released.steps.filter(({ id }) => after.has(id)).map(({ id }) => id);
  if (!same(common, earlier)) {
    const moved = common.filter((id, i) => earlier[i] !== id);
    const places = [...common];
    const steps = released.steps.map((step) => (after.has(step.id) ? before.get(places.shift()!)! : step));
    changes.push({ kind: 'order', stepIds: moved, sequence: withSteps(steps) });
  }
  if (!same(released.decisionRule, draft.decisionRule))
    changes.push({ kind: 'rule', stepIds: [], sequence: { ...released, decisionRule: draft.decisionRule } });
  return changes.length > 1 && changes.length <= mostSingleChanges ? changes : [];
}

/** Behind the nearest step before it that the released revision has too. */
function inserted(released: readonly Step[], draft: readonly Step[], step: Step): Step[] {
  const ahead = draft.slice(0, draft.indexOf(step)).findLast(({ id }) => released.some((each) => each.id === id));
  const place = ahead ? released.findIndex(({ id }) => id === ahead.id) + 1 : 0;
  return [...released.slice(0, place), step, ...released.slice(place)];
}
