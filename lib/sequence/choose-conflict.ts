import { conflictKey, type Conflict, type Draft, type StoredDraft } from './draft';
import { giveReason, moveStep, removeStep, setField, setRule } from './draft-edits';

/** What both changed, chosen: my own as it stands here, or what the other person saved. */
export function chooseConflict(draft: Draft, conflict: Conflict, choice: 'mine' | 'theirs'): Draft {
  const key = conflictKey(conflict);
  const chosen = choice === 'theirs' ? takeTheirs(draft, conflict) : takeMine(draft, conflict);
  return { ...chosen, conflicts: chosen.conflicts.filter((each) => conflictKey(each) !== key) };
}

/**
 * What may be stored of a draft: where a choice is still open, what the other person saved stays stored, so that mine does not
 * replace it unseen.
 */
export function storable(draft: Draft): StoredDraft {
  const { sequence, warningReasons } = draft.conflicts.reduce((each, conflict) => takeTheirs(each, conflict), {
    ...draft,
    conflicts: [],
  } as Draft);
  return { sequence, warningReasons };
}

function takeMine(draft: Draft, conflict: Conflict): Draft {
  return conflict.kind === 'removed-here' ? removeStep(draft, conflict.stepId) : draft;
}

function takeTheirs(draft: Draft, conflict: Conflict): Draft {
  switch (conflict.kind) {
    case 'value':
      return setField(draft, { stepId: conflict.stepId, field: conflict.field, value: conflict.theirs });
    case 'step': {
      const steps = draft.sequence.steps.map((step) => (step.id === conflict.stepId ? conflict.theirs : step));
      return { ...draft, sequence: { ...draft.sequence, steps } };
    }
    case 'removed-there':
      return removeStep(draft, conflict.stepId);
    case 'removed-here':
      return draft;
    case 'place': {
      const others = draft.sequence.steps.filter(({ id }) => id !== conflict.stepId);
      return moveStep(draft, conflict.stepId, others.findIndex(({ id }) => id === conflict.after) + 1);
    }
    case 'rule':
      return setRule(draft, conflict.theirs);
    case 'reason':
      return giveReason(draft, conflict.key, conflict.theirs);
  }
}
