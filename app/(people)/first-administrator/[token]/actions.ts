'use server';

import { firstAdministratorSchema } from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { makeFirstAdministrator } from '@/server/operations/people/first-administrator';

/** The token in the form is the authority: it works once. */
export async function makeFirstAdministratorAction(input: unknown): Promise<Outcome> {
  const form = parseForm(firstAdministratorSchema, input);
  return form.ok ? makeFirstAdministrator(form.value) : form;
}
