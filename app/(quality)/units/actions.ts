'use server';

import { revalidatePath } from 'next/cache';
import {
  dispositionSchema,
  printAgainSchema,
  retestOrderSchema,
  secondSignatureSchema,
} from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { completeConcession } from '@/server/operations/units/complete-concession';
import { orderRetest } from '@/server/operations/units/order-retest';
import { printLabelAgain } from '@/server/operations/units/print-label-again';
import { signDispositions } from '@/server/operations/units/sign-dispositions';

export async function signDispositionsAction(input: unknown): Promise<Outcome<{ boards: number }>> {
  const actor = await authorise('sign-concessions');
  const form = parseForm(dispositionSchema, input);
  if (!form.ok) return form;
  const outcome = await signDispositions(actor, form.value);
  if (outcome.ok) revalidateDecisions();
  return outcome;
}

export async function completeConcessionAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('sign-concessions');
  const form = parseForm(secondSignatureSchema, input);
  if (!form.ok) return form;
  const outcome = await completeConcession(actor, form.value);
  if (outcome.ok) revalidateDecisions();
  return outcome;
}

export async function orderRetestAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('order-retests');
  const form = parseForm(retestOrderSchema, input);
  if (!form.ok) return form;
  const outcome = await orderRetest(actor, form.value);
  if (outcome.ok) revalidatePath('/units', 'layout');
  return outcome;
}

export async function printLabelAgainAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('print-labels');
  const form = parseForm(printAgainSchema, input);
  if (!form.ok) return form;
  const outcome = await printLabelAgain(actor, form.value.unitId);
  if (outcome.ok) revalidatePath('/units', 'layout');
  return outcome;
}

function revalidateDecisions(): void {
  revalidatePath('/units', 'layout');
  revalidatePath('/rejects');
  revalidatePath('/lots', 'layout');
}
