import { findAccount } from '@/db/queries/accounts';
import { endSessionsAtStation, findActor, insertSession } from '@/db/queries/sessions';
import type { Actor } from '@/lib/access/actor';
import { mayDo } from '@/lib/access/permissions';
import { refusal, success } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { trySecret, type SignInRefusal } from './try-secret';

/**
 * Begins the bench session of a badge's holder by PIN. The caller has made sure that the browser is enrolled at this station.
 * Whoever was signed in there is signed out. Codes: wrong-pin, too-many-tries (with the time of the next try).
 */
export async function signInAtBench(given: {
  stationId: string;
  accountId: string;
  digits: string;
}): Promise<{ ok: true; value: Actor } | SignInRefusal> {
  const db = database();
  const found = await findAccount(db, given.accountId);
  const account = found && !found.disabledAt && mayDo(found.roles, 'use-bench') ? found : null;
  const subject = { identifier: given.accountId, stationId: given.stationId };
  const tried = await trySecret(db, subject, account?.pinHash ?? null, given.digits);
  if (!tried.ok) return tried;
  if (!account || !tried.right) return refusal('wrong-pin', 'The PIN is wrong. Try again.');
  const sessionId = await db.transaction(async (tx) => {
    await endSessionsAtStation(tx, given.stationId);
    return insertSession(tx, { accountId: account.id, stationId: given.stationId });
  });
  const actor = await findActor(db, sessionId);
  if (!actor) return refusal('wrong-pin', 'The account was closed a moment ago. Ask the administrator.');
  return success(actor);
}
