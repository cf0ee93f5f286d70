import { kindOf } from '../steps/step-kinds';
import type { SentenceField } from '../steps/step-kind';
import type { DecisionRule, Step } from './step';

/** What a step is called: the engineer's name for it, else the word of its kind. */
export const stepWord = (step: Step): string => step.name || kindOf(step).word;

/** The number as it is shown: in the unit and with the decimals of its blank. */
export function shownNumber(value: number, { scale = 1, decimals }: Pick<SentenceField, 'scale' | 'decimals'>): string {
  const shown = value * scale;
  const text = decimals === undefined ? String(Number(shown.toPrecision(9))) : shown.toFixed(decimals);
  return text.replace('-', '\u2212');
}

/** A value of a step as it is read: "0.60 A", "between two beeps", "no limit". `steps` name the step that a branch goes to. */
export function valueWords(value: unknown, blank: SentenceField, steps: readonly Step[]): string {
  if (value === undefined) return 'not given';
  if (value === null) return blank.whenNull ?? 'none';
  if (blank.options) return blank.options.find((option) => option.value === value)?.label ?? String(value);
  if (blank.input === 'step') {
    const step = steps.find(({ id }) => id === value);
    return step ? stepWord(step) : 'a step that is gone';
  }
  if (blank.input === 'picture') return 'a picture';
  if (typeof value === 'boolean') return value ? 'on' : 'off';
  if (typeof value !== 'number') return typeof value === 'string' ? `“${value}”` : JSON.stringify(value);
  return `${shownNumber(value, blank)}${blank.unit ? ` ${blank.unit}` : ''}`;
}

export function ruleWords(rule: DecisionRule): string {
  return rule.kind === 'simple' ? 'simple acceptance' : `limits drawn in by ${rule.factor} × U`;
}
