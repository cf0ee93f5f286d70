'use server';

import { revalidatePath } from 'next/cache';
import { issueCertificateSchema, revokeCertificateSchema } from '@/lib/contracts/certificate';
import type { Outcome } from '@/lib/contracts/outcome';
import { parseForm } from '@/lib/contracts/parse-form';
import { authorise } from '@/server/auth/authorise';
import { issueCertificate } from '@/server/operations/certificates/issue-certificate';
import { revokeCertificate } from '@/server/operations/certificates/revoke-certificate';

export async function issueCertificateAction(input: unknown): Promise<Outcome<{ id: string; number: string }>> {
  const actor = await authorise('issue-certificates');
  const form = parseForm(issueCertificateSchema, input);
  if (!form.ok) return form;
  const outcome = await issueCertificate(actor, form.value);
  if (outcome.ok) revalidateCertificates();
  return outcome;
}

export async function revokeCertificateAction(input: unknown): Promise<Outcome> {
  const actor = await authorise('issue-certificates');
  const form = parseForm(revokeCertificateSchema, input);
  if (!form.ok) return form;
  const outcome = await revokeCertificate(actor, form.value);
  if (outcome.ok) revalidateCertificates();
  return outcome;
}

function revalidateCertificates(): void {
  revalidatePath('/certificates');
  revalidatePath('/units', 'layout');
  revalidatePath('/lots', 'layout');
}
