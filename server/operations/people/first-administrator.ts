import { insertAccountLink, accountLinkWorks, spendAccountLink } from '@/db/queries/account-links';
import { lockAdministrators, insertAccount } from '@/db/queries/accounts';
import { insertTrail } from '@/db/queries/trail';
import type { firstAdministratorSchema } from '@/lib/contracts/people';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { hashSecret, hashToken, makeToken } from '@/server/auth/secret-hash';
import { environment } from '@/server/environment';
import { database } from '@/server/postgres';
import type { z } from 'zod';

const linkHours = 24;

/** A link that makes the first administrator, once, within a day. Null when there is an administrator. */
export async function firstAdministratorLink(): Promise<string | null> {
  const token = makeToken();
  const needed = await database().transaction(async (tx) => {
    if ((await lockAdministrators(tx)).length > 0) return false;
    await insertAccountLink(tx, {
      kind: 'first-administrator',
      tokenHash: hashToken(token),
      accountId: null,
      hours: linkHours,
    });
    return true;
  });
  return needed ? `${environment().publicUrl}/first-administrator/${token}` : null;
}

export function firstAdministratorLinkWorks(token: string): Promise<boolean> {
  return accountLinkWorks(database(), 'first-administrator', hashToken(token));
}

/** Makes the first administrator. Codes: link-spent, administrator-exists. */
export async function makeFirstAdministrator(form: z.infer<typeof firstAdministratorSchema>): Promise<Outcome> {
  const passwordHash = await hashSecret(form.password);
  return database().transaction(async (tx) => {
    const link = await spendAccountLink(tx, 'first-administrator', hashToken(form.token));
    if (!link)
      return refusal('link-spent', 'This link was used or is older than a day. Start the server again for a new one.');
    if ((await lockAdministrators(tx)).length > 0)
      return refusal('administrator-exists', 'There is an administrator already. Ask them for an account.');
    const account = await insertAccount(tx, {
      name: form.name,
      email: form.email,
      passwordHash,
      roles: ['administrator'],
    });
    await insertTrail(tx, null, {
      action: 'account.first-administrator',
      entity: 'account',
      entityId: account.id,
      after: { name: account.name, email: account.email, roles: account.roles },
    });
    return done;
  });
}
