import type { SentenceField } from '../steps/step-kind';
import { kindOf } from '../steps/step-kinds';
import { blankKey, ruleFactorKey, type Draft } from './draft';
import type { FieldChange } from './finding';
import { readBlank, readNumber } from './read-blank';
import { setFieldValue } from './set-field-value';
import { decisionRuleSchema, type DecisionRule, type Step } from './step';

/** Edits of a draft. Each returns the draft itself where it changes nothing. */

export const mostSteps = 80;

function withSteps(draft: Draft, steps: Step[]): Draft {
  return { ...draft, sequence: { ...draft.sequence, steps } };
}

function changeStep(draft: Draft, stepId: string, change: (step: Step) => Step): Draft {
  const steps = draft.sequence.steps.map((step) => (step.id === stepId ? change(step) : step));
  return steps.every((step, i) => step === draft.sequence.steps[i]) ? draft : withSteps(draft, steps);
}

function keepUnread(draft: Draft, key: string, text: string | null): Draft {
  if (text === null && !(key in draft.unread)) return draft;
  const { [key]: _before, ...others } = draft.unread;
  return { ...draft, unread: text === null ? others : { ...others, [key]: text } };
}

/** What was typed into a blank: its value where it can be read, else the text as it stands. */
export function typeInto(draft: Draft, stepId: string, blank: SentenceField, typed: string): Draft {
  const step = draft.sequence.steps.find(({ id }) => id === stepId);
  if (!step) return draft;
  const read = readBlank(step, blank, typed);
  const key = blankKey(stepId, blank.field);
  return read.ok ? setField(draft, { stepId, field: blank.field, value: read.value }) : keepUnread(draft, key, typed);
}

/** A value chosen rather than typed. */
export function setField(draft: Draft, { stepId, field, value }: { stepId: string; field: string; value: unknown }) {
  const readable = keepUnread(draft, blankKey(stepId, field), null);
  return changeStep(readable, stepId, (step) => {
    const next = setFieldValue(step, field, value);
    return JSON.stringify(next) === JSON.stringify(step) ? step : next;
  });
}

/** Puts right what a finding names. */
export function mend(draft: Draft, changes: readonly FieldChange[]): Draft {
  return changes.reduce(setField, draft);
}

export function renameStep(draft: Draft, stepId: string, name: string): Draft {
  const short = name.slice(0, 40);
  return changeStep(draft, stepId, (step) => (step.name === short ? step : { ...step, name: short }));
}

export function switchStep(draft: Draft, stepId: string, enabled: boolean): Draft {
  return changeStep(draft, stepId, (step) => (step.enabled === enabled ? step : { ...step, enabled }));
}

/** Puts a step after another; null: at the beginning. A draft holds at most `mostSteps`. */
export function insertStep(draft: Draft, step: Step, after: string | null): Draft {
  const { steps } = draft.sequence;
  if (steps.length >= mostSteps || steps.some(({ id }) => id === step.id)) return draft;
  const at = after === null ? 0 : steps.findIndex(({ id }) => id === after) + 1 || steps.length;
  return withSteps(draft, [...steps.slice(0, at), step, ...steps.slice(at)]);
}

/** A copy right after the step, with what was typed and cannot be read yet. */
export function duplicateStep(draft: Draft, stepId: string, newId: string): Draft {
  const step = draft.sequence.steps.find(({ id }) => id === stepId);
  if (!step) return draft;
  const copied = insertStep(draft, { ...step, id: newId }, stepId);
  if (copied === draft) return draft;
  const texts = Object.entries(draft.unread).filter(([key]) => key.startsWith(blankKey(stepId, '')));
  const copies = texts.map(([key, text]) => [key.replace(stepId, newId), text]);
  return { ...copied, unread: { ...copied.unread, ...Object.fromEntries(copies) } };
}

/** A sequence keeps two steps at least. */
export function removeStep(draft: Draft, stepId: string): Draft {
  const { steps } = draft.sequence;
  const left = steps.filter(({ id }) => id !== stepId);
  if (left.length === steps.length || left.length < 2) return draft;
  const unread = Object.entries(draft.unread).filter(([key]) => !key.startsWith(blankKey(stepId, '')));
  const conflicts = draft.conflicts.filter((each) => !('stepId' in each) || each.stepId !== stepId);
  return { ...withSteps(draft, left), unread: Object.fromEntries(unread), conflicts };
}

/** Moves a step to a place counted from 0, as it is after the move. */
export function moveStep(draft: Draft, stepId: string, to: number): Draft {
  const { steps } = draft.sequence;
  const from = steps.findIndex(({ id }) => id === stepId);
  const place = Math.min(steps.length - 1, Math.max(0, to));
  if (from < 0 || from === place) return draft;
  const others = steps.filter(({ id }) => id !== stepId);
  return withSteps(draft, [...others.slice(0, place), steps[from]!, ...others.slice(place)]);
}

export function setRule(draft: Draft, rule: DecisionRule): Draft {
  const readable = keepUnread(draft, ruleFactorKey, null);
  if (JSON.stringify(rule) === JSON.stringify(draft.sequence.decisionRule)) return readable;
  return { ...readable, sequence: { ...readable.sequence, decisionRule: rule } };
}

/** The factor of the guard band, 0 to 3. */
export function typeRuleFactor(draft: Draft, typed: string): Draft {
  const factor = readNumber(typed);
  const rule = decisionRuleSchema.safeParse({ kind: 'guard-band', factor });
  return rule.success ? setRule(draft, rule.data) : keepUnread(draft, ruleFactorKey, typed);
}

export function giveReason(draft: Draft, key: string, reason: string): Draft {
  if ((draft.warningReasons[key] ?? '') === reason) return draft;
  const { [key]: _before, ...others } = draft.warningReasons;
  return { ...draft, warningReasons: reason === '' ? others : { ...others, [key]: reason.slice(0, 300) } };
}

/** A new step of a kind, with values that suit the board type. */
export function freshStep(
  kind: Step['kind'],
  id: string,
  boardType: Parameters<ReturnType<typeof kindOf>['fresh']>[0],
) {
  return { id, name: '', enabled: true, ...kindOf({ kind }).fresh(boardType) } as Step;
}
