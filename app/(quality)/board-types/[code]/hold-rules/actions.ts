'use server';

import { revalidatePath } from 'next/cache';
import { setHoldRulesSchema } from '@/lib/contracts/lot-hold';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { setHoldRules } from '@/server/operations/holds/set-hold-rules';

export async function setHoldRulesAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('approve-limits');
  const form = parseForm(setHoldRulesSchema, input);
  if (!form.ok) return form;
  const outcome = await setHoldRules(actor, form.value);
  if (outcome.ok) revalidatePath('/board-types', 'layout');
  return outcome;
}
