/** An expected failure: `code` for callers, `sentence` for a person to act on, `field` when one field of a form is meant. */
export interface Refusal {
  ok: false;
  code: string;
  sentence: string;
  field?: string;
}

export type Outcome<T = null> = { ok: true; value: T } | Refusal;

export const done: { ok: true; value: null } = { ok: true, value: null };

export function success<T>(value: T): { ok: true; value: T } {
  return { ok: true, value };
}

export function refusal(code: string, sentence: string, field?: string): Refusal {
  return field === undefined ? { ok: false, code, sentence } : { ok: false, code, sentence, field };
}
