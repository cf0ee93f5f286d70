import { accountLinkWorks, insertAccountLink, spendAccountLink } from '@/db/queries/account-links';
import { findAccount, updateAccount } from '@/db/queries/accounts';
import { endSessionsOfAccount } from '@/db/queries/sessions';
import { clearFailures } from '@/db/queries/sign-in-attempts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { hashSecret, hashToken, makeToken } from '@/server/auth/secret-hash';
import { environment } from '@/server/environment';
import { database } from '@/server/postgres';

const linkHours = 72;

/** A link by which the person chooses a password, once, within three days. Codes: account-unknown, email-missing. */
export async function makePasswordLink(
  actor: Actor,
  form: { accountId: string },
): Promise<Outcome<{ link: string; hours: number }>> {
  const token = makeToken();
  return database().transaction(async (tx) => {
    const account = await findAccount(tx, form.accountId);
    if (!account || account.disabledAt) return refusal('account-unknown', 'This account does not exist or is closed.');
    if (!account.email)
      return refusal('email-missing', 'Give the account an e-mail address first: it signs in with it.');
    await insertAccountLink(tx, {
      kind: 'choose-password',
      tokenHash: hashToken(token),
      accountId: account.id,
      hours: linkHours,
    });
    await insertTrail(tx, actor, {
      action: 'account.password-link',
      entity: 'account',
      entityId: account.id,
      after: { name: account.name, hours: linkHours },
    });
    return success({ link: `${environment().publicUrl}/choose-password/${token}`, hours: linkHours });
  });
}

export function passwordLinkWorks(token: string): Promise<boolean> {
  return accountLinkWorks(database(), 'choose-password', hashToken(token));
}

/** Sets the password that the person chose and ends their other sessions. Codes: link-spent. */
export async function choosePassword(form: { token: string; password: string }): Promise<Outcome> {
  const passwordHash = await hashSecret(form.password);
  return database().transaction(async (tx) => {
    const link = await spendAccountLink(tx, 'choose-password', hashToken(form.token));
    const account = link?.accountId ? await findAccount(tx, link.accountId) : null;
    if (!account || account.disabledAt)
      return refusal('link-spent', 'This link was used or is too old. Ask the administrator for a new one.');
    await updateAccount(tx, account.id, { passwordHash });
    await endSessionsOfAccount(tx, account.id, 'password-changed');
    await clearFailures(tx, account.id);
    await insertTrail(
      tx,
      { accountId: account.id, stationId: null },
      { action: 'account.password-chosen', entity: 'account', entityId: account.id, after: { name: account.name } },
    );
    return done;
  });
}
