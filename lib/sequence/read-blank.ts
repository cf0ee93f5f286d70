import type { SentenceField } from '../steps/step-kind';
import { kindOf } from '../steps/step-kinds';
import { setFieldValue } from './set-field-value';
import type { Step } from './step';
import { shownNumber } from './value-words';

export type BlankRead = { ok: true; value: string | number | boolean | null } | { ok: false; sentence: string };

/**
 * Reads what was typed into a blank. Takes a comma or a point, and the unit after the number. Refused with a sentence where it is
 * no value, or one that the step cannot hold.
 */
export function readBlank(step: Step, blank: SentenceField, typed: string): BlankRead {
  const read = parse(blank, typed);
  if (!read.ok) return read;
  const schema = kindOf(step).schema.safeParse(setFieldValue(step, blank.field, read.value));
  if (schema.success) return read;
  const issue = schema.error.issues.find(({ path }) => path.join('.') === blank.field);
  return issue ? { ok: false, sentence: sentenceOf(issue as Issue, blank) } : read;
}

interface Issue {
  code: string;
  minimum?: number;
  maximum?: number;
  inclusive?: boolean;
}

function parse(blank: SentenceField, typed: string): BlankRead {
  const text = typed.trim();
  if (blank.input === 'text') return { ok: true, value: typed };
  if (text === '' || text.toLowerCase() === blank.whenNull)
    return blank.whenNull === undefined
      ? { ok: false, sentence: `Enter ${blank.input === 'whole-number' ? 'a whole number' : 'a number'}.` }
      : { ok: true, value: null };
  const number = readNumber(text, blank.unit);
  if (number === null) return { ok: false, sentence: `“${text}” is not a number${inUnit(blank)}.` };
  if (blank.input === 'whole-number' && !Number.isInteger(number))
    return { ok: false, sentence: `“${text}” is not a whole number.` };
  return { ok: true, value: unscaled(number, blank.scale) };
}

/** The number typed, with or without its unit; null where it is none. Thin and plain spaces group digits: "60 000". */
export function readNumber(typed: string, unit?: string): number | null {
  let text = typed.trim().replace(/\u2212/g, '-');
  if (unit && text.toLowerCase().endsWith(unit.toLowerCase())) text = text.slice(0, -unit.length).trim();
  text = text.replace(/(?<=\d)[\s\u202f](?=\d{3}(?!\d))/g, '');
  if (/^[+-]?\d*,\d*$/.test(text)) text = text.replace(',', '.');
  return /^[+-]?(\d+\.?\d*|\.\d+)$/.test(text) ? Number(text) : null;
}

/** Stored from shown; a scale of 1000 divides, so that 4 mV is 0.004 and not its neighbour. */
const unscaled = (number: number, scale = 1) => Number((number / scale).toPrecision(12));

const inUnit = ({ unit }: SentenceField) => (unit ? ` of ${unit}` : '');

function sentenceOf({ code, minimum, maximum, inclusive = true }: Issue, blank: SentenceField): string {
  const said = (bound: number) => `${shownNumber(bound, { scale: blank.scale })}${blank.unit ? ` ${blank.unit}` : ''}`;
  if (blank.input === 'text') {
    if (code === 'too_small') return `Use at least ${minimum} characters.`;
    return code === 'too_big' ? `Use at most ${maximum} characters.` : 'Enter other words.';
  }
  if (code === 'too_small' && minimum !== undefined)
    return inclusive ? `Use ${said(minimum)} or more.` : `Use more than ${said(minimum)}.`;
  if (code === 'too_big' && maximum !== undefined)
    return inclusive ? `Use ${said(maximum)} or less.` : `Use less than ${said(maximum)}.`;
  return 'Enter another value.';
}

/** The text of a blank for editing: its usual decimals, or as many more as the value needs. Null: empty. */
export function blankText(value: unknown, blank: SentenceField): string {
  if (value === null || value === undefined) return '';
  if (typeof value !== 'number') return String(value);
  const shown = Number((value * (blank.scale ?? 1)).toPrecision(12));
  let decimals = blank.decimals ?? 0;
  while (decimals < 9 && Number(shown.toFixed(decimals)) !== shown) decimals++;
  return shown.toFixed(decimals).replace('-', '\u2212');
}
