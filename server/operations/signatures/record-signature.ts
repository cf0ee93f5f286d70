import type { Transaction } from '@/db/client';
import { insertSignature, type Signature } from '@/db/queries/signatures';
import type { Actor } from '@/lib/access/actor';
import { canonicalJson } from '@/lib/canonical-json';
import { sha256 } from '../trail/sha256';

export interface Signed {
  /** Kind and id of what is signed, such as disposition. */
  subject: string;
  subjectId: string;
  /** The words that were agreed to. */
  meaning: string;
  /** Exactly what was signed. */
  content: Record<string, unknown>;
}

/**
 * Binds a signature to what it signs, inside the transaction of the act. The password was confirmed for this very act
 * (`confirmSignature`). Name and time stand as they were.
 */
export function recordSignature(
  tx: Transaction,
  actor: Pick<Actor, 'accountId' | 'name'>,
  { subject, subjectId, meaning, content }: Signed,
  at = new Date(),
): Promise<Signature> {
  const { accountId, name } = actor;
  const digest = digestOf(content);
  return insertSignature(tx, { accountId, name, signedAt: at, meaning, subject, subjectId, content, digest });
}

/** Whether a signature still fits what it is kept with. */
export function signatureHolds({ content, digest }: Pick<Signature, 'content' | 'digest'>): boolean {
  return digestOf(content) === digest;
}

/** Hexadecimal SHA-256 of the canonical JSON. */
export function digestOf(content: Record<string, unknown>): string {
  return sha256(canonicalJson(content));
}
