import type { z } from 'zod';

type Issue = z.core.$ZodIssue;

const kinds: Record<string, string> = {
  number: 'a number',
  int: 'a whole number',
  string: 'a text in quotes',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
};

/** Why a value of a file is not taken, in a sentence. `whole` is what was read, to say what stands there. */
export function reasonOf(issue: Issue, whole: unknown): string {
  const given = issue.path.reduce<unknown>(
    (value, key) => (value === null || value === undefined ? undefined : (value as Record<PropertyKey, unknown>)[key]),
    whole,
  );
  if (given === undefined) return 'It is missing.';
  switch (issue.code) {
    case 'invalid_type':
      return `It must be ${kinds[issue.expected] ?? issue.expected}, not ${shown(given)}.`;
    case 'invalid_value':
      return `It must be ${listed(issue.values)}, not ${shown(given)}.`;
    case 'too_small':
      return sized(issue.origin, `${issue.inclusive === false ? 'more than' : 'at least'} ${issue.minimum}`);
    case 'too_big':
      return sized(issue.origin, `${issue.inclusive === false ? 'less than' : 'at most'} ${issue.maximum}`);
    case 'invalid_union':
      return `${shown(given)} is not one that this format knows.`;
    default:
      return issue.message.endsWith('.') ? issue.message : `${issue.message}.`;
  }
}

function sized(origin: string, size: string): string {
  if (origin === 'string') return `It must have ${size} characters.`;
  return origin === 'array' ? `It must have ${size} entries.` : `It must be ${size}.`;
}

const listed = (values: readonly unknown[]) =>
  values.length === 1 ? JSON.stringify(values[0]) : `one of ${values.map((each) => JSON.stringify(each)).join(', ')}`;

function shown(value: unknown): string {
  if (Array.isArray(value)) return 'a list';
  if (value !== null && typeof value === 'object') return 'an object';
  const text = JSON.stringify(value) ?? 'nothing';
  return text.length > 40 ? `${text.slice(0, 39)}…` : text;
}
