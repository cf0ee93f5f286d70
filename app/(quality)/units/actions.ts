'use server';

import { revalidatePath } from 'next/cache';
import { dispositionSchema, printAgainSchema, retestOrderSchema } from '@/lib/contracts/disposition';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { orderRetest } from '@/server/operations/units/order-retest';
import { printLabelAgain } from '@/server/operations/units/print-label-again';
import { signDisposition } from '@/server/operations/units/sign-disposition';

export async function signDispositionAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('sign-dispositions');
  const form = parseForm(dispositionSchema, input);
  if (!form.ok) return form;
  const outcome = await signDisposition(actor, form.value);
  if (outcome.ok) revalidatePath('/units', 'layout');
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
