'use server';

import { revalidatePath } from 'next/cache';
import {
  approveLimitsSchema,
  askApprovalSchema,
  beginBoardTypeDraftSchema,
  discardBoardTypeDraftSchema,
  newBoardTypeSchema,
  saveBoardTypeSchema,
  sendBackLimitsSchema,
  takeBackSchema,
} from '@/lib/contracts/board-type-revision';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { approveLimits } from '@/server/operations/engineering/board-types/approve';
import { askApproval } from '@/server/operations/engineering/board-types/ask-approval';
import { beginBoardTypeDraft } from '@/server/operations/engineering/board-types/begin-draft';
import { discardBoardTypeDraft } from '@/server/operations/engineering/board-types/discard-draft';
import { newBoardType } from '@/server/operations/engineering/board-types/new-board-type';
import { saveBoardTypeDraft } from '@/server/operations/engineering/board-types/save-draft';
import { sendBackLimits, takeBack } from '@/server/operations/engineering/board-types/send-back';

function shownAgain<T>(outcome: Outcome<T>): Outcome<T> {
  if (outcome.ok) revalidatePath('/board-types', 'layout');
  return outcome;
}

export async function newBoardTypeAction(input: unknown): Promise<Outcome<{ code: string }>> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(newBoardTypeSchema, input);
  return form.ok ? shownAgain(await newBoardType(actor, form.value)) : form;
}

export async function beginDraftAction(input: unknown): Promise<Outcome<{ revisionId: string; number: number }>> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(beginBoardTypeDraftSchema, input);
  return form.ok ? shownAgain(await beginBoardTypeDraft(actor, form.value)) : form;
}

export async function saveDraftAction(input: unknown): Promise<Outcome<{ version: number }>> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(saveBoardTypeSchema, input);
  return form.ok ? shownAgain(await saveBoardTypeDraft(actor, form.value)) : form;
}

export async function discardDraftAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(discardBoardTypeDraftSchema, input);
  return form.ok ? shownAgain(await discardBoardTypeDraft(actor, form.value)) : form;
}

export async function askApprovalAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(askApprovalSchema, input);
  return form.ok ? shownAgain(await askApproval(actor, form.value)) : form;
}

export async function takeBackAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('edit-board-types');
  const form = parseForm(takeBackSchema, input);
  return form.ok ? shownAgain(await takeBack(actor, form.value)) : form;
}

export async function approveAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('approve-limits');
  const form = parseForm(approveLimitsSchema, input);
  return form.ok ? shownAgain(await approveLimits(actor, form.value)) : form;
}

export async function sendBackAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('approve-limits');
  const form = parseForm(sendBackLimitsSchema, input);
  return form.ok ? shownAgain(await sendBackLimits(actor, form.value)) : form;
}
