import type { z } from 'zod';
import { refusal, type Outcome } from './outcome';

/** What a form sent, as its schema wants it; refused with the first sentence and the field it stands beside. Code: form-invalid. */
export function parseForm<S extends z.ZodType>(schema: S, input: unknown): Outcome<z.infer<S>> {
  const parsed = schema.safeParse(input);
  if (parsed.success) return { ok: true, value: parsed.data };
  const issue = parsed.error.issues[0]!;
  return refusal('form-invalid', issue.message, issue.path.join('.') || undefined);
}
