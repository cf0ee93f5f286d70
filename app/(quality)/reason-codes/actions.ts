'use server';

import { revalidatePath } from 'next/cache';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { mergeReasonCodeSchema, newReasonCodeSchema, retireReasonCodeSchema } from '@/lib/contracts/reason-code';
import { authorise } from '@/server/auth/authorise';
import { addReasonCode } from '@/server/operations/reason-codes/add-reason-code';
import { mergeReasonCode } from '@/server/operations/reason-codes/merge-reason-code';
import { retireReasonCode } from '@/server/operations/reason-codes/retire-reason-code';

export async function addReasonCodeAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-reason-codes');
  const form = parseForm(newReasonCodeSchema, input);
  if (!form.ok) return form;
  const outcome = await addReasonCode(actor, form.value);
  if (outcome.ok) revalidatePath('/reason-codes');
  return outcome;
}

export async function retireReasonCodeAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-reason-codes');
  const form = parseForm(retireReasonCodeSchema, input);
  if (!form.ok) return form;
  const outcome = await retireReasonCode(actor, form.value.id, form.value.retired);
  if (outcome.ok) revalidatePath('/reason-codes');
  return outcome;
}

export async function mergeReasonCodeAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-reason-codes');
  const form = parseForm(mergeReasonCodeSchema, input);
  if (!form.ok) return form;
  const outcome = await mergeReasonCode(actor, form.value);
  if (outcome.ok) revalidatePath('/reason-codes');
  return outcome;
}
