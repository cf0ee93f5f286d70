import { findBoardType } from '@/db/queries/board-type-revisions';
import { listRuleSets } from '@/db/queries/lot-holds';
import type { HoldRulesPage } from '@/lib/contracts/lot-hold';
import { usualRuleSet } from '@/lib/quality/hold-cause';
import { database } from '@/server/postgres';

/** What holds lots of a board type and who set it so; null when there is no such board type. */
export async function readHoldRules(code: string): Promise<HoldRulesPage | null> {
  const db = database();
  const type = await findBoardType(db, code);
  if (!type) return null;
  const sets = await listRuleSets(db, type.id);
  return {
    code,
    name: type.name,
    rules: sets[0]?.rules ?? usualRuleSet,
    history: sets.map(({ setBy, setAt, reason }) => ({ setBy, reason, setIso: setAt.toISOString() })),
  };
}
