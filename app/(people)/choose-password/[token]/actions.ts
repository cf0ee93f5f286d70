'use server';

import { choosePasswordSchema } from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { choosePassword } from '@/server/operations/people/choose-password';

/** The token in the form is the authority: it works once. */
export async function choosePasswordAction(input: unknown): Promise<Outcome> {
  const form = parseForm(choosePasswordSchema, input);
  return form.ok ? choosePassword(form.value) : form;
}
