import { findAccount, updateAccount } from '@/db/queries/accounts';
import { clearFailures } from '@/db/queries/sign-in-attempts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { hashSecret } from '@/server/auth/secret-hash';
import { database } from '@/server/postgres';

/** Sets the PIN of a badge; tries that failed with the old one no longer make anyone wait. Codes: account-unknown. */
export async function setPin(actor: Actor, form: { accountId: string; pin: string }): Promise<Outcome> {
  const pinHash = await hashSecret(form.pin);
  return database().transaction(async (tx) => {
    const account = await findAccount(tx, form.accountId);
    if (!account) return refusal('account-unknown', 'This account does not exist.');
    await updateAccount(tx, account.id, { pinHash });
    await clearFailures(tx, account.id);
    await insertTrail(tx, actor, {
      action: 'account.pin-set',
      entity: 'account',
      entityId: account.id,
      after: { name: account.name },
    });
    return done;
  });
}
