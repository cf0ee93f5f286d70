import { findBoardType } from '@/db/queries/board-type-revisions';
import { findRuleSet, insertRuleSet } from '@/db/queries/lot-holds';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { canonicalJson } from '@/lib/canonical-json';
import type { SetHoldRules } from '@/lib/contracts/lot-hold';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { usualRuleSet } from '@/lib/quality/hold-cause';
import { database } from '@/server/postgres';

/** Sets what holds lots of a board type from the next board on. Codes: board-type-unknown, nothing-changed. */
export async function setHoldRules(
  actor: Actor,
  { code, rules, reason }: SetHoldRules,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const type = await findBoardType(tx, code);
    if (!type) return refusal('board-type-unknown', 'This board type does not exist.');
    const before = (await findRuleSet(tx, type.id))?.rules ?? usualRuleSet;
    if (canonicalJson(before) === canonicalJson(rules))
      return refusal('nothing-changed', 'These rules count already. Nothing was stored.');
    await insertRuleSet(tx, { boardTypeId: type.id, rules, reason, setBy: actor.accountId, setAt: at });
    await insertTrail(tx, actor, {
      action: 'board-type.hold-rules-set',
      entity: 'board-type',
      entityId: type.id,
      before: { ...before },
      after: { code, ...rules },
      reason,
    });
    return done;
  });
}
