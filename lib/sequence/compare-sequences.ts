import type { SentenceField } from '../steps/step-kind';
import { kindOf } from '../steps/step-kinds';
import { fieldsOf, fieldValue } from './field-value';
import { keptOrder } from './kept-order';
import type { Sequence, Step } from './step';
import { ruleWords, shownNumber, valueWords } from './value-words';

/** One value that differs. Texts are as people read them; `before` and `after` are as stored. */
export interface ValueChange {
  field: string;
  label: string;
  before: unknown;
  after: unknown;
  from: string;
  to: string;
  tone: 'trip' | 'release' | null;
  /** Where both are numbers: in the unit shown, and their difference in words. */
  numbers: { from: number; to: number; difference: string } | null;
}

/** One step of two sequences, paired by its id. */
export interface StepComparison {
  stepId: string;
  /** Null: the step is only in the other one. */
  before: Step | null;
  after: Step | null;
  /** Places from 1. */
  placeBefore: number | null;
  placeAfter: number | null;
  /** Out of the order that the others keep. */
  moved: boolean;
  switched: 'on' | 'off' | null;
  renamed: boolean;
  values: ValueChange[];
  changed: boolean;
}

export interface SequenceComparison {
  /** In the order of the later sequence; a removed step stands after the one it followed. */
  steps: StepComparison[];
  /** Null: the same rule. */
  rule: { from: string; to: string } | null;
  stepsChanged: number;
  /** Values, names, switches and places that differ. */
  valuesChanged: number;
  same: boolean;
}

/** What differs between two sequences, field by field; steps are paired by their id, so a moved step is not a new one. */
export function compareSequences(before: Sequence, after: Sequence): SequenceComparison {
  const kept = keptOrder(
    before.steps.map(({ id }) => id),
    after.steps.map(({ id }) => id),
  );
  const pair = (a: Step | null, b: Step | null) => compareStep(a, b, before.steps, after.steps, kept);
  const steps = after.steps.map((step) => pair(before.steps.find(({ id }) => id === step.id) ?? null, step));
  before.steps.forEach((step, place) => {
    if (after.steps.some(({ id }) => id === step.id)) return;
    const followed = before.steps[place - 1]?.id;
    const at = followed === undefined ? -1 : steps.findIndex(({ stepId }) => stepId === followed);
    steps.splice(at + 1, 0, pair(step, null));
  });
  const sameRule = JSON.stringify(ruleOf(before)) === JSON.stringify(ruleOf(after));
  const rule = sameRule ? null : { from: ruleWords(before.decisionRule), to: ruleWords(after.decisionRule) };
  const changed = steps.filter((step) => step.changed);
  const counts = changed.map(({ values, moved, switched, renamed, before: a, after: b }) =>
    a && b ? values.length + Number(moved) + Number(switched !== null) + Number(renamed) : 1,
  );
  return {
    steps,
    rule,
    stepsChanged: changed.length,
    valuesChanged: counts.reduce((sum, each) => sum + each, rule ? 1 : 0),
    same: changed.length === 0 && rule === null,
  };
}

const ruleOf = ({ decisionRule: rule }: Sequence) => (rule.kind === 'simple' ? [rule.kind] : [rule.kind, rule.factor]);

function compareStep(
  before: Step | null,
  after: Step | null,
  stepsBefore: readonly Step[],
  stepsAfter: readonly Step[],
  kept: ReadonlySet<string>,
): StepComparison {
  const { id } = (after ?? before)!;
  const place = (step: Step | null, steps: readonly Step[]) => (step ? steps.indexOf(step) + 1 : null);
  const both = before !== null && after !== null;
  const moved = both && !kept.has(id);
  const switched = both && before.enabled !== after.enabled ? (after.enabled ? 'on' : 'off') : null;
  const renamed = both && before.name !== after.name;
  const values = both ? compareValues(before, after, stepsBefore, stepsAfter) : [];
  return {
    stepId: id,
    before,
    after,
    placeBefore: place(before, stepsBefore),
    placeAfter: place(after, stepsAfter),
    moved,
    switched,
    renamed,
    values,
    changed: !both || moved || switched !== null || renamed || values.length > 0,
  };
}

function compareValues(
  before: Step,
  after: Step,
  stepsBefore: readonly Step[],
  stepsAfter: readonly Step[],
): ValueChange[] {
  const [blanksBefore, blanksAfter] = [blanksOf(before), blanksOf(after)];
  const spoken = [...blanksAfter, ...blanksBefore].map(({ field }) => field);
  const values = [...new Set([...spoken, ...fieldsOf(after), ...fieldsOf(before)])].flatMap((field): ValueChange[] => {
    const [a, b] = [fieldValue(before, field), fieldValue(after, field)];
    if (JSON.stringify(a) === JSON.stringify(b)) return [];
    const of = (blanks: SentenceField[]) => blanks.find((blank) => blank.field === field);
    const [blankOld, blankNew] = [of(blanksBefore), of(blanksAfter)];
    const blankAfter = finerWhereAlike(a, b, blankNew ?? blankOld ?? unspoken(field));
    const blankBefore = finerWhereAlike(a, b, blankOld ?? blankNew ?? unspoken(field));
    return [
      {
        field,
        label: blankAfter.label,
        before: a,
        after: b,
        from: valueWords(a, blankBefore, stepsBefore),
        to: valueWords(b, blankAfter, stepsAfter),
        tone: blankAfter.tone ?? null,
        numbers: numbersOf(a, b, blankAfter),
      },
    ];
  });
  if (before.kind === after.kind) return values;
  const kind = { field: 'kind', label: 'Kind', before: before.kind, after: after.kind, tone: null, numbers: null };
  return [{ ...kind, from: kindOf(before).word, to: kindOf(after).word }, ...values];
}

const blanksOf = (step: Step) =>
  kindOf(step)
    .sentence(step)
    .filter((part): part is SentenceField => typeof part !== 'string');

/** A stored field that no blank speaks of: settleMs is "Settle ms". */
function unspoken(field: string): SentenceField {
  const words = field.replace(/[.]/g, ', ').replace(/([a-z0-9])([A-Z])/g, (_, low, high) => `${low} ${high}`);
  return { field, label: words.charAt(0).toUpperCase() + words.slice(1).toLowerCase(), input: 'text' };
}

/** Decimals are added until two different numbers read differently. */
function finerWhereAlike(a: unknown, b: unknown, blank: SentenceField): SentenceField {
  if (typeof a !== 'number' || typeof b !== 'number' || blank.decimals === undefined) return blank;
  let { decimals } = blank;
  while (decimals < 9 && shownNumber(a, { ...blank, decimals }) === shownNumber(b, { ...blank, decimals })) decimals++;
  return { ...blank, decimals };
}

function numbersOf(a: unknown, b: unknown, blank: SentenceField): ValueChange['numbers'] {
  if (typeof a !== 'number' || typeof b !== 'number' || blank.options) return null;
  const scale = blank.scale ?? 1;
  const difference = `${b > a ? '+' : ''}${shownNumber(b - a, blank)}${blank.unit ? ` ${blank.unit}` : ''}`;
  return { from: a * scale, to: b * scale, difference };
}
