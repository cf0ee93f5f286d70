'use server';

import { revalidatePath } from 'next/cache';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { trainingSchema } from '@/lib/contracts/training';
import { authorise } from '@/server/auth/authorise';
import { recordTraining } from '@/server/operations/engineering/trainings';

export async function recordTrainingAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('record-training');
  const form = parseForm(trainingSchema, input);
  if (!form.ok) return form;
  const outcome = await recordTraining(actor, form.value);
  if (outcome.ok) revalidatePath('/training');
  return outcome;
}
