import { findAccount, lockAdministrators, updateAccount } from '@/db/queries/accounts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { isLastOf, lastAdministrator } from './last-administrator';

/**
 * Closes an account; its sessions, pages and sockets end within moments. Records that name it stay as they are.
 * Codes: account-unknown, own-account, last-administrator.
 */
export async function disablePerson(actor: Actor, form: { accountId: string; reason: string }): Promise<Outcome> {
  if (form.accountId === actor.accountId)
    return refusal('own-account', 'Nobody closes their own account. Ask another administrator.');
  return database().transaction(async (tx) => {
    const administrators = await lockAdministrators(tx);
    const account = await findAccount(tx, form.accountId);
    if (!account) return refusal('account-unknown', 'This account does not exist.');
    if (account.disabledAt) return done;
    if (isLastOf(administrators, account.id)) return lastAdministrator;
    await updateAccount(tx, account.id, { disabledAt: new Date() });
    await insertTrail(tx, actor, {
      action: 'account.disabled',
      entity: 'account',
      entityId: account.id,
      before: { name: account.name, disabled: false },
      after: { name: account.name, disabled: true },
      reason: form.reason,
    });
    return done;
  });
}

/** Opens a closed account again. Codes: account-unknown. */
export async function enablePerson(actor: Actor, form: { accountId: string; reason: string }): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const account = await findAccount(tx, form.accountId);
    if (!account) return refusal('account-unknown', 'This account does not exist.');
    if (!account.disabledAt) return done;
    await updateAccount(tx, account.id, { disabledAt: null });
    await insertTrail(tx, actor, {
      action: 'account.enabled',
      entity: 'account',
      entityId: account.id,
      before: { name: account.name, disabled: true },
      after: { name: account.name, disabled: false },
      reason: form.reason,
    });
    return done;
  });
}
