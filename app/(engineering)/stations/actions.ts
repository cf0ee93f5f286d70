'use server';

import { revalidatePath } from 'next/cache';
import { dailyCheckSchema } from '@/lib/contracts/daily-check';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { recordDailyCheck } from '@/server/operations/engineering/record-daily-check';

export async function recordDailyCheckAction(input: unknown): Promise<Outcome<{ passed: boolean }>> {
  const actor = await authorise('set-daily-check');
  const form = parseForm(dailyCheckSchema, input);
  if (!form.ok) return form;
  const outcome = await recordDailyCheck(actor, form.value);
  if (outcome.ok) revalidatePath('/stations', 'layout');
  return outcome;
}
