import fc from 'fast-check';
import { cb1210 } from '@/db/seed/board-types';
import { openDraft, type Draft, type StoredDraft } from '@/lib/sequence/draft';
import {
  duplicateStep,
  freshStep,
  giveReason,
  insertStep,
  moveStep,
  removeStep,
  renameStep,
  setField,
  setRule,
  switchStep,
} from '@/lib/sequence/draft-edits';
import { fieldsOf, fieldValue } from '@/lib/sequence/field-value';
import { stepKinds } from '@/lib/steps/step-kinds';
import { anySequence } from './any-sequence';

/** One edit at a time, as a person makes them; the numbers choose where. */
const anyEdit = (who: string): fc.Arbitrary<(draft: Draft) => Draft> =>
  fc.tuple(fc.constantFrom(...edits), fc.nat(99), fc.nat(99)).map(
    ([edit, a, b]) =>
      (draft) =>
        edit(draft, draft.sequence.steps[a % draft.sequence.steps.length]!.id, { a, b, who }),
  );

type Where = { a: number; b: number; who: string };
const edits: ((draft: Draft, id: string, where: Where) => Draft)[] = [
  (draft, id, { b, who }) => {
    const step = draft.sequence.steps.find((each) => each.id === id)!;
    const field = fieldsOf(step)[b % Math.max(1, fieldsOf(step).length)];
    const value = field === undefined ? undefined : fieldValue(step, field);
    if (field === undefined || typeof value !== 'number') return draft;
    return setField(draft, { stepId: id, field, value: value + (who === 'mine' ? 1 : 2) });
  },
  (draft, id, { b, who }) => renameStep(draft, id, `${who} ${b}`),
  (draft, id, { b }) => switchStep(draft, id, b % 2 === 0),
  (draft, id, { b }) => moveStep(draft, id, b % draft.sequence.steps.length),
  (draft, id) => removeStep(draft, id),
  (draft, id, { a, b, who }) =>
    insertStep(draft, freshStep(stepKinds[b % stepKinds.length]!.kind, `${who}-${a}-${b}`, cb1210), id),
  (draft, id, { a, b, who }) => duplicateStep(draft, id, `${who}-copy-${a}-${b}`),
  (draft, _id, { b, who }) => giveReason(draft, `warning-${b % 3}`, `${who} says ${b}`),
  (draft, _id, { b }) => setRule(draft, { kind: 'guard-band', factor: (b % 30) / 10 }),
];

export const anyEdits = (who: string) => fc.array(anyEdit(who), { maxLength: 8 });

export const anyStored: fc.Arbitrary<StoredDraft> = fc.record({
  sequence: anySequence,
  warningReasons: fc.dictionary(fc.constantFrom('warning-0', 'warning-1'), fc.constantFrom('as agreed', 'tried')),
});

export const edited = (stored: StoredDraft, all: readonly ((draft: Draft) => Draft)[]): Draft =>
  all.reduce((draft, edit) => edit(draft), openDraft(stored));
