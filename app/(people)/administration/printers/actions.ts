'use server';

import { revalidatePath } from 'next/cache';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { printerIdSchema, printerSchema } from '@/lib/contracts/printer';
import { authorise } from '@/server/auth/authorise';
import { retirePrinter, savePrinter } from '@/server/operations/stations/printers';

const page = '/administration/printers';

export async function savePrinterAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-printers');
  const form = parseForm(printerSchema, input);
  if (!form.ok) return form;
  const outcome = await savePrinter(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}

export async function retirePrinterAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('manage-printers');
  const form = parseForm(printerIdSchema, input);
  if (!form.ok) return form;
  const outcome = await retirePrinter(actor, form.value);
  if (outcome.ok) revalidatePath(page);
  return outcome;
}
