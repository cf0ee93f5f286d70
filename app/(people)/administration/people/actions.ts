'use server';

import { revalidatePath } from 'next/cache';
import {
  accountIdSchema,
  addPersonSchema,
  changePersonSchema,
  setPinSchema,
  withReasonSchema,
} from '@/lib/contracts/people';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { addPerson } from '@/server/operations/people/add-person';
import { changePerson } from '@/server/operations/people/change-person';
import { makePasswordLink } from '@/server/operations/people/choose-password';
import { disablePerson, enablePerson } from '@/server/operations/people/disable-person';
import { setPin } from '@/server/operations/people/set-pin';

const page = '/administration/people';

export async function addPersonAction(input: unknown): Promise<Outcome<{ accountId: string }>> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(addPersonSchema, input);
  if (!form.ok) return form;
  const outcome = await addPerson(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function changePersonAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(changePersonSchema, input);
  if (!form.ok) return form;
  const outcome = await changePerson(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function setPinAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(setPinSchema, input);
  if (!form.ok) return form;
  const outcome = await setPin(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function makePasswordLinkAction(input: unknown): Promise<Outcome<{ link: string; hours: number }>> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(accountIdSchema, input);
  return form.ok ? makePasswordLink(actor, form.value) : form;
}

export async function disablePersonAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(withReasonSchema, input);
  if (!form.ok) return form;
  const outcome = await disablePerson(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function enablePersonAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-accounts');
  const form = parseForm(withReasonSchema, input);
  if (!form.ok) return form;
  const outcome = await enablePerson(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}
