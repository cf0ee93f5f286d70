import { findAccountByBadge, findAccountByOperatorNumber } from '@/db/queries/accounts';
import { mayDo } from '@/lib/access/permissions';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

export interface BadgeHolder {
  accountId: string;
  /** Shown at the bench. */
  number: string;
}

/**
 * Whose badge this is. By hand, the number printed on the badge or the operator's own number is taken for `badgeCode`.
 * Codes: badge-unknown, badge-not-for-bench, pin-not-chosen.
 */
export async function findBadge(given: { badgeCode: string; byHand: boolean }): Promise<Outcome<BadgeHolder>> {
  const db = database();
  const code = given.badgeCode.trim().toUpperCase();
  const account =
    (await findAccountByBadge(db, code)) ??
    (given.byHand ? await findAccountByOperatorNumber(db, code.replace(/^SWB-/, '')) : null);
  if (!account || account.disabledAt)
    return refusal('badge-unknown', 'This badge is not known here. Ask the administrator.');
  if (!mayDo(account.roles, 'use-bench'))
    return refusal('badge-not-for-bench', 'The holder of this badge has no role at a bench.');
  if (!account.pinHash) return refusal('pin-not-chosen', 'This badge has no PIN yet. Ask the administrator for one.');
  return success({ accountId: account.id, number: account.operatorNumber ?? code });
}
