import { findAccountByEmail } from '@/db/queries/accounts';
import { insertSession } from '@/db/queries/sessions';
import { refusal, success } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { trySecret, type SignInRefusal } from './try-secret';

export interface DeskSignIn {
  accountId: string;
  sessionId: string;
}

/** Begins a desk session for an e-mail address and its password. Codes: wrong-sign-in, too-many-tries. */
export async function signInAtDesk(given: {
  email: string;
  password: string;
}): Promise<{ ok: true; value: DeskSignIn } | SignInRefusal> {
  const db = database();
  const email = given.email.trim().toLowerCase();
  const found = await findAccountByEmail(db, email);
  const account = found && !found.disabledAt ? found : null;
  const subject = { identifier: account?.id ?? email.slice(0, 200), stationId: null };
  const tried = await trySecret(db, subject, account?.passwordHash ?? null, given.password);
  if (!tried.ok) return tried;
  if (!account || !tried.right)
    return refusal('wrong-sign-in', 'The e-mail address and the password do not belong together. Check both.');
  return success({
    accountId: account.id,
    sessionId: await insertSession(db, { accountId: account.id, stationId: null }),
  });
}
