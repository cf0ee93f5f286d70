'use client';

import { useToast } from '@/components/ui/toast';
import type { Draft } from '@/lib/sequence/draft';
import { duplicateStep, insertStep, moveStep, mostSteps, removeStep, switchStep } from '@/lib/sequence/draft-edits';
import { stepWord } from '@/lib/sequence/value-words';
import { goTo, rowId } from './blank-ids';
import { newId } from './new-id';
import type { StepActs } from './step-menu';

export interface StepCommands {
  actsOf(stepId: string): Omit<StepActs, 'rename'>;
  moveTo(stepId: string, place: number): void;
  switchOver(stepId: string): void;
}

interface Commanded {
  draft: Draft;
  edit(change: (draft: Draft) => Draft): void;
  select(stepId: string | null): void;
  /** Opens the list of kinds. */
  addAfter(stepId: string): void;
  /** Read aloud where the eye sees it by itself. */
  say(text: string): void;
}

/** What moves, copies and removes steps, from menus and keys alike. */
export function useStepCommands({ draft, edit, select, addAfter, say }: Commanded): StepCommands {
  const toast = useToast();
  const { steps } = draft.sequence;
  const placeOf = (stepId: string) => steps.findIndex(({ id }) => id === stepId);

  function moveBy(stepId: string, by: number): void {
    const to = placeOf(stepId) + by;
    if (to < 0 || to >= steps.length) return;
    const focused = document.activeElement as HTMLElement | null;
    edit((now) => moveStep(now, stepId, to));
    say(`${stepWord(steps[placeOf(stepId)]!)} is now step ${to + 1}.`);
    // React may move the row in the document, which drops the focus.
    requestAnimationFrame(() => {
      if (focused && document.activeElement !== focused) focused.focus();
      document.getElementById(rowId(stepId))?.scrollIntoView({ block: 'nearest' });
    });
  }

  function remove(stepId: string): void {
    const place = placeOf(stepId);
    const step = steps[place]!;
    if (steps.length <= 2) return toast('A sequence keeps two steps at least.');
    edit((now) => removeStep(now, stepId));
    const next = steps[place + 1] ?? steps[place - 1]!;
    select(next.id);
    requestAnimationFrame(() => goTo({ stepId: next.id, field: null }));
    const after = steps[place - 1]?.id ?? null;
    toast(`Step ${place + 1}, ${stepWord(step)}, is removed.`, () => {
      edit((now) => insertStep(now, step, after));
      select(step.id);
    });
  }

  function duplicate(stepId: string): void {
    if (steps.length >= mostSteps) return toast(`A sequence holds at most ${mostSteps} steps.`);
    const id = newId();
    edit((now) => duplicateStep(now, stepId, id));
    select(id);
    requestAnimationFrame(() => goTo({ stepId: id, field: null }));
  }

  return {
    actsOf: (stepId) => ({
      addAfter: () => addAfter(stepId),
      duplicate: () => duplicate(stepId),
      moveUp: () => moveBy(stepId, -1),
      moveDown: () => moveBy(stepId, 1),
      remove: () => remove(stepId),
    }),
    moveTo: (stepId, place) => edit((now) => moveStep(now, stepId, place)),
    switchOver: (stepId) => {
      const step = steps[placeOf(stepId)];
      if (step) edit((now) => switchStep(now, stepId, !step.enabled));
    },
  };
}
