import { blankKey, conflictKey, sameContent, type Conflict, type Draft, type StoredDraft } from './draft';
import { fieldsOf, fieldValue } from './field-value';
import { mergeOrder } from './merge-order';
import { setFieldValue } from './set-field-value';
import type { Step } from './step';

interface Merging {
  base: StoredDraft;
  mine: Draft;
  theirs: StoredDraft;
  by: string;
  conflicts: Map<string, Conflict>;
}

/**
 * Brings into a draft what another person saved since `base`, by step and by field. What only one changed is taken; what both
 * changed stays as it is here and becomes a conflict, so that nothing of either is lost.
 */
export function mergeDrafts(base: StoredDraft, mine: Draft, theirs: StoredDraft, by: string): Draft {
  const merging: Merging = { base, mine, theirs, by, conflicts: new Map() };
  const ids = (draft: StoredDraft) => draft.sequence.steps.map(({ id }) => id);
  const merged = new Map(
    [...new Set([...ids(mine), ...ids(theirs)])].flatMap((id) => {
      const step = mergeStep(merging, id);
      return step ? [[id, step] as const] : [];
    }),
  );
  const { order, conflicts: places } = mergeOrder({
    base: ids(base),
    mine: ids(mine),
    theirs: ids(theirs),
    kept: new Set(merged.keys()),
  });
  for (const { id, after } of places) note(merging, { kind: 'place', stepId: id, after, by });
  const steps = order.map((id) => merged.get(id)!);
  const draft = {
    sequence: { steps, decisionRule: mergeRule(merging) },
    warningReasons: mergeReasons(merging),
    unread: Object.fromEntries(
      Object.entries(mine.unread).filter(([key]) => key.startsWith('rule/') || merged.has(key.split('/')[0]!)),
    ),
  };
  return { ...draft, conflicts: [...standing(merging, draft), ...merging.conflicts.values()] };
}

function note({ conflicts }: Merging, conflict: Conflict): void {
  conflicts.set(conflictKey(conflict), conflict);
}

const stepOf = ({ sequence }: StoredDraft, id: string) => sequence.steps.find((step) => step.id === id);

function mergeStep(merging: Merging, id: string): Step | null {
  const { base, mine, theirs, by } = merging;
  const [before, here, there] = [stepOf(base, id), stepOf(mine, id), stepOf(theirs, id)];
  if (here && there) return mergeFields(merging, before, here, there);
  if (here) {
    if (!before) return here;
    const typed = Object.keys(mine.unread).some((key) => key.startsWith(blankKey(id, '')));
    if (!typed && sameContent(before, here)) return null;
    note(merging, { kind: 'removed-there', stepId: id, by });
    return here;
  }
  if (!before) return there!;
  if (sameContent(before, there)) return null;
  note(merging, { kind: 'removed-here', stepId: id, by });
  return there!;
}

function mergeFields(merging: Merging, before: Step | undefined, here: Step, there: Step): Step {
  const { mine, by } = merging;
  if (here === there || sameContent(here, there)) return here;
  if (here.kind !== there.kind) {
    if (before && sameContent(before, here)) return there;
    if (!before || !sameContent(before, there)) note(merging, { kind: 'step', stepId: here.id, theirs: there, by });
    return here;
  }
  const fields = new Set(['name', 'enabled', ...fieldsOf(here), ...fieldsOf(there)]);
  let merged = here;
  for (const field of fields) {
    const [was, own, other] = [before, here, there].map((step) => step && fieldValue(step, field));
    const typed = blankKey(here.id, field) in mine.unread;
    if (sameContent(own, other) || (before && sameContent(was, other))) continue;
    if (before && !typed && sameContent(was, own)) merged = setFieldValue(merged, field, other);
    else note(merging, { kind: 'value', stepId: here.id, field, theirs: other, by });
  }
  return merged;
}

function mergeRule(merging: Merging) {
  const { base, mine, theirs, by } = merging;
  const [was, own, other] = [base, mine, theirs].map((draft) => draft.sequence.decisionRule);
  if (sameContent(own, other) || sameContent(was, other)) return own!;
  if (sameContent(was, own)) return other!;
  note(merging, { kind: 'rule', theirs: other!, by });
  return own!;
}

function mergeReasons(merging: Merging): Record<string, string> {
  const { base, mine, theirs, by } = merging;
  const keys = [mine, theirs].flatMap((draft) => Object.keys(draft.warningReasons));
  const pairs = [...new Set(keys)].flatMap((key) => {
    const [was = '', own = '', other = ''] = [base, mine, theirs].map((draft) => draft.warningReasons[key]);
    const bothChanged = own !== other && was !== own && was !== other;
    if (bothChanged) note(merging, { kind: 'reason', key, theirs: other, by });
    const reason = was === own ? other : own;
    return reason === '' ? [] : [[key, reason] as const];
  });
  return Object.fromEntries(pairs);
}

/** Conflicts not yet chosen on that are still ones, with what stands there now. */
function standing({ mine, theirs, conflicts }: Merging, draft: StoredDraft): Conflict[] {
  return mine.conflicts.flatMap((conflict): Conflict[] => {
    if (conflicts.has(conflictKey(conflict))) return [];
    const { kind } = conflict;
    if (kind === 'rule') {
      const other = theirs.sequence.decisionRule;
      return sameContent(other, draft.sequence.decisionRule) ? [] : [{ ...conflict, theirs: other }];
    }
    if (kind === 'reason') {
      const other = theirs.warningReasons[conflict.key] ?? '';
      return other === (draft.warningReasons[conflict.key] ?? '') ? [] : [{ ...conflict, theirs: other }];
    }
    const [here, there] = [stepOf(draft, conflict.stepId), stepOf(theirs, conflict.stepId)];
    if (!here) return [];
    if (kind === 'removed-there') return there ? [] : [conflict];
    if (!there) return [];
    if (kind === 'step') return sameContent(here, there) ? [] : [{ ...conflict, theirs: there }];
    if (kind !== 'value') return [conflict];
    const other = fieldValue(there, conflict.field);
    const settled = sameContent(other, fieldValue(here, conflict.field));
    return settled && !(blankKey(here.id, conflict.field) in mine.unread) ? [] : [{ ...conflict, theirs: other }];
  });
}
