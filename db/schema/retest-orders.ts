import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';
import { runs } from './runs';
import { units } from './units';

/** Quality orders one more run of a passed or waiting board. */
export const retestOrders = pgTable(
  'retest_orders',
  {
    id: id(),
    unitId: uuid()
      .notNull()
      .references(() => units.id),
    reason: text().notNull(),
    signedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    signedAt: momentNow(),
    /** The run made under it. Null: not used yet. An order serves one run. */
    usedByRunId: uuid()
      .unique()
      .references(() => runs.id),
  },
  (t) => [index().on(t.unitId)],
);
