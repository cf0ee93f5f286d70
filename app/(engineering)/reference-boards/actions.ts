'use server';

import { revalidatePath } from 'next/cache';
import { changeReferenceBoardSchema, referenceBoardSchema } from '@/lib/contracts/daily-check';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { addReferenceBoard, changeReferenceBoard } from '@/server/operations/engineering/reference-boards';

export async function addReferenceBoardAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('set-daily-check');
  const form = parseForm(referenceBoardSchema, input);
  if (!form.ok) return form;
  const outcome = await addReferenceBoard(actor, form.value);
  if (outcome.ok) revalidatePath('/reference-boards');
  return outcome;
}

export async function changeReferenceBoardAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('set-daily-check');
  const form = parseForm(changeReferenceBoardSchema, input);
  if (!form.ok) return form;
  const outcome = await changeReferenceBoard(actor, form.value);
  if (outcome.ok) revalidatePath('/reference-boards');
  return outcome;
}
