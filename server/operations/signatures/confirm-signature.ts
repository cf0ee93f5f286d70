import { findAccount } from '@/db/queries/accounts';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { trySecret } from '../people/try-secret';

/**
 * Whoever signs gives their password again; tries are counted as at signing in. Codes: wrong-password, too-many-tries.
 */
export async function confirmSignature(actor: Actor, password: string): Promise<Outcome> {
  const db = database();
  const account = await findAccount(db, actor.accountId);
  const tried = await trySecret(
    db,
    { identifier: actor.accountId, stationId: null },
    account?.passwordHash ?? null,
    password,
  );
  if (!tried.ok) return { ...tried, field: 'password' };
  return tried.right ? done : refusal('wrong-password', 'Not the password. Enter it again.', 'password');
}
