'use server';

import { revalidatePath } from 'next/cache';
import { endOfferSchema } from '@/lib/contracts/engineering-offer';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { offerDraftSchema } from '@/lib/contracts/sequence-draft';
import { authorise } from '@/server/auth/authorise';
import { endOffer } from '@/server/operations/engineering/offers/end-offer';
import { offerDraft } from '@/server/operations/engineering/offers/offer-draft';

export async function offerDraftAction(input: unknown): Promise<Outcome<{ offerId: string }>> {
  const actor = await authorise('make-engineering-runs');
  const form = parseForm(offerDraftSchema, input);
  if (!form.ok) return form;
  const outcome = await offerDraft(actor, form.value);
  if (outcome.ok) revalidatePath('/sequences', 'layout');
  return outcome;
}

export async function endOfferAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('make-engineering-runs');
  const form = parseForm(endOfferSchema, input);
  if (!form.ok) return form;
  const outcome = await endOffer(actor, form.value.offerId);
  if (outcome.ok) revalidatePath('/sequences', 'layout');
  return outcome;
}
