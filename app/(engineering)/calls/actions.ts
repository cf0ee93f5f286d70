'use server';

import { acknowledgeCallSchema } from '@/lib/contracts/engineer-call';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { acknowledgeCall } from '@/server/operations/engineering/calls';

export async function acknowledgeCallAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('acknowledge-calls');
  const form = parseForm(acknowledgeCallSchema, input);
  return form.ok ? acknowledgeCall(actor, form.value.callId) : form;
}
