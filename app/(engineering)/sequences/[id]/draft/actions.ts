'use server';

import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { saveDraftSchema, type SavedDraft } from '@/lib/contracts/sequence-draft';
import { authorise } from '@/server/auth/authorise';
import { saveDraft } from '@/server/operations/engineering/sequences/save-draft';

/** Called as the draft is typed, so nothing is revalidated: the editor has what it sent. */
export async function saveDraftAction(input: unknown): Promise<Outcome<SavedDraft>> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(saveDraftSchema, input);
  return form.ok ? saveDraft(actor, form.value) : form;
}
