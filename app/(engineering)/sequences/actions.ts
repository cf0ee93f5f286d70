'use server';

import { revalidatePath } from 'next/cache';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import {
  beginDraftSchema,
  discardDraftSchema,
  importSequenceSchema,
  newSequenceSchema,
  releaseRevisionSchema,
  sendBackSchema,
  submitRevisionSchema,
  withdrawRevisionSchema,
  type ImportedSequence,
} from '@/lib/contracts/sequence-draft';
import { authorise } from '@/server/auth/authorise';
import { beginDraft } from '@/server/operations/engineering/sequences/begin-draft';
import { discardDraft } from '@/server/operations/engineering/sequences/discard-draft';
import { importSequence } from '@/server/operations/engineering/sequences/import-sequence';
import { newSequence } from '@/server/operations/engineering/sequences/new-sequence';
import { releaseRevision } from '@/server/operations/engineering/sequences/release-revision';
import { sendBack } from '@/server/operations/engineering/sequences/send-back';
import { submitRevision } from '@/server/operations/engineering/sequences/submit-revision';
import { withdrawRevision } from '@/server/operations/engineering/sequences/withdraw-revision';

function shown<T>(outcome: Outcome<T>): Outcome<T> {
  if (outcome.ok) revalidatePath('/sequences', 'layout');
  return outcome;
}

export async function newSequenceAction(input: unknown): Promise<Outcome<{ sequenceId: string; revisionId: string }>> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(newSequenceSchema, input);
  return form.ok ? shown(await newSequence(actor, form.value)) : form;
}

export async function beginDraftAction(input: unknown): Promise<Outcome<{ revisionId: string; number: number }>> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(beginDraftSchema, input);
  return form.ok ? shown(await beginDraft(actor, form.value)) : form;
}

export async function discardDraftAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(discardDraftSchema, input);
  return form.ok ? shown(await discardDraft(actor, form.value)) : form;
}

export async function submitRevisionAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(submitRevisionSchema, input);
  return form.ok ? shown(await submitRevision(actor, form.value)) : form;
}

export async function sendBackAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('release-sequences');
  const form = parseForm(sendBackSchema, input);
  return form.ok ? shown(await sendBack(actor, form.value)) : form;
}

export async function releaseRevisionAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('release-sequences');
  const form = parseForm(releaseRevisionSchema, input);
  return form.ok ? shown(await releaseRevision(actor, form.value)) : form;
}

export async function withdrawRevisionAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('release-sequences');
  const form = parseForm(withdrawRevisionSchema, input);
  return form.ok ? shown(await withdrawRevision(actor, form.value)) : form;
}

export async function importSequenceAction(input: unknown): Promise<Outcome<ImportedSequence>> {
  const actor = await authorise('edit-sequences');
  const form = parseForm(importSequenceSchema, input);
  return form.ok ? shown(await importSequence(actor, form.value)) : form;
}
