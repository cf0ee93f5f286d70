'use server';

import { revalidatePath } from 'next/cache';
import type { SerialRow } from '@/lib/contracts/lot-serials';
import {
  changeLotSchema,
  checkLotSerialsSchema,
  componentBatchSchema,
  createLotSchema,
  lotReasonSchema,
  lotReleaseSchema,
} from '@/lib/contracts/lot';
import { chooseBaselineSchema } from '@/lib/contracts/lot-review';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { moveLotSchema } from '@/lib/contracts/sequence-draft';
import { authorise } from '@/server/auth/authorise';
import { changeLot } from '@/server/operations/lots/change-lot';
import { checkLotSerials } from '@/server/operations/lots/check-lot-serials';
import { chooseBaseline } from '@/server/operations/lots/choose-baseline';
import { createLot } from '@/server/operations/lots/create-lot';
import { holdLot, releaseLot } from '@/server/operations/lots/hold-lot';
import { moveLot } from '@/server/operations/lots/move-lot';
import { recordComponentBatch } from '@/server/operations/lots/record-component-batch';

export async function checkLotSerialsAction(input: unknown): Promise<Outcome<SerialRow[]>> {
  await authorise('manage-lots');
  const form = parseForm(checkLotSerialsSchema, input);
  return form.ok ? checkLotSerials(form.value) : form;
}

export async function createLotAction(input: unknown): Promise<Outcome<{ code: string; size: number }>> {
  const actor = await authorise('manage-lots');
  const form = parseForm(createLotSchema, input);
  if (!form.ok) return form;
  const outcome = await createLot(actor, form.value);
  if (outcome.ok) revalidatePath('/lots');
  return outcome;
}

export async function changeLotAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-lots');
  const form = parseForm(changeLotSchema, input);
  if (!form.ok) return form;
  const outcome = await changeLot(actor, form.value.lotId, form.value.change);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}

export async function holdLotAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('hold-lots');
  const form = parseForm(lotReasonSchema, input);
  if (!form.ok) return form;
  const outcome = await holdLot(actor, form.value.lotId, form.value.reason);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}

export async function releaseLotAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('hold-lots');
  const form = parseForm(lotReleaseSchema, input);
  if (!form.ok) return form;
  const outcome = await releaseLot(actor, form.value);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}

export async function recordComponentBatchAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-lots');
  const form = parseForm(componentBatchSchema, input);
  if (!form.ok) return form;
  const outcome = await recordComponentBatch(actor, form.value);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}

export async function moveLotAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-lots');
  const form = parseForm(moveLotSchema, input);
  if (!form.ok) return form;
  const outcome = await moveLot(actor, form.value);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}

export async function chooseBaselineAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-lots');
  const form = parseForm(chooseBaselineSchema, input);
  if (!form.ok) return form;
  const outcome = await chooseBaseline(actor, form.value);
  if (outcome.ok) revalidatePath('/lots', 'layout');
  return outcome;
}
