import type { Database } from '@/db/client';
import { markTrySucceeded, reserveTry, type TrySubject } from '@/db/queries/sign-in-attempts';
import { refusal, type Refusal } from '@/lib/contracts/outcome';
import { secretFits } from '@/server/auth/secret-hash';

export type SignInRefusal = Refusal & { retryAtIso?: string };

export function tooManyTries(retryAt: Date): SignInRefusal {
  return {
    ...refusal('too-many-tries', 'Too many wrong tries. Wait, then try again.'),
    retryAtIso: retryAt.toISOString(),
  };
}

/**
 * Evaluates a password or PIN as one counted try. `right` says whether it fits; refused when no try may be evaluated yet.
 * `secretHash` null: there is no such account, or it has no secret; the work is done all the same.
 */
export async function trySecret(
  db: Database,
  subject: TrySubject,
  secretHash: string | null,
  secret: string,
  now = new Date(),
): Promise<{ ok: true; right: boolean } | SignInRefusal> {
  const reserved = await reserveTry(db, subject, now);
  if (!reserved.ok) return tooManyTries(reserved.retryAt);
  const right = await secretFits(secretHash, secret);
  if (right) await markTrySucceeded(db, reserved.attemptId);
  return { ok: true, right };
}
