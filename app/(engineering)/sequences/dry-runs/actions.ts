'use server';

import { revalidatePath } from 'next/cache';
import { askDryRunSchema, dryRunIdSchema, keepDryRunSchema, type DryRunView } from '@/lib/contracts/dry-run';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { askDryRun } from '@/server/operations/engineering/dry-runs/ask-dry-run';
import { cancelDryRun } from '@/server/operations/engineering/dry-runs/cancel-dry-run';
import { keepDryRun } from '@/server/operations/engineering/dry-runs/keep-dry-run';

export async function askDryRunAction(input: unknown): Promise<Outcome<DryRunView>> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(askDryRunSchema, input);
  return form.ok ? askDryRun(actor, form.value.revisionId, form.value.settings) : form;
}

export async function cancelDryRunAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(dryRunIdSchema, input);
  return form.ok ? cancelDryRun(actor, form.value.id) : form;
}

export async function keepDryRunAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(keepDryRunSchema, input);
  if (!form.ok) return form;
  const outcome = await keepDryRun(actor, form.value.id, form.value.kept);
  if (outcome.ok) revalidatePath('/sequences', 'layout');
  return outcome;
}
