import { index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import type { HoldRuleSet } from '@/lib/contracts/lot-hold';
import { accounts } from './accounts';
import { boardTypes } from './board-types';
import { id, momentNow } from './columns';

/** What holds a lot of a board type by itself. The newest row counts; none: the usual rules. Only ever added to. */
export const holdRuleSets = pgTable(
  'hold_rule_sets',
  {
    id: id(),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    rules: jsonb().$type<HoldRuleSet>().notNull(),
    reason: text().notNull(),
    setBy: uuid()
      .notNull()
      .references(() => accounts.id),
    setAt: momentNow(),
  },
  (t) => [index().on(t.boardTypeId, t.setAt)],
);
