'use server';

import { revalidatePath } from 'next/cache';
import { calibrationSchema, changeInstrumentSchema, instrumentSchema } from '@/lib/contracts/calibration';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { addInstrument, changeInstrument, recordCalibration } from '@/server/operations/engineering/instruments';

export async function addInstrumentAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-instruments');
  const form = parseForm(instrumentSchema, input);
  if (!form.ok) return form;
  const outcome = await addInstrument(actor, form.value);
  if (outcome.ok) revalidatePath('/instruments');
  return outcome;
}

export async function changeInstrumentAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-instruments');
  const form = parseForm(changeInstrumentSchema, input);
  if (!form.ok) return form;
  const outcome = await changeInstrument(actor, form.value);
  if (outcome.ok) revalidatePath('/instruments');
  return outcome;
}

export async function recordCalibrationAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-instruments');
  const form = parseForm(calibrationSchema, input);
  if (!form.ok) return form;
  const outcome = await recordCalibration(actor, form.value);
  if (outcome.ok) revalidatePath('/instruments');
  return outcome;
}
