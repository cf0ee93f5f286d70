import { relations } from 'drizzle-orm';
import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';
import { lots } from './lots';
import { stations } from './stations';

/** From `fromAt` on, boards of the lot carry this batch of the component, until a later row for the same component. */
export const lotComponents = pgTable(
  'lot_components',
  {
    id: id(),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    /** Position or name on the parts list, such as D1 reference. */
    component: text().notNull(),
    batch: text().notNull(),
    fromAt: momentNow(),
    byAccountId: uuid()
      .notNull()
      .references(() => accounts.id),
    /** Null: entered at a desk. */
    stationId: uuid().references(() => stations.id),
  },
  (t) => [index().on(t.lotId, t.component, t.fromAt)],
);

export const lotComponentRelations = relations(lotComponents, ({ one }) => ({
  lot: one(lots, { fields: [lotComponents.lotId], references: [lots.id] }),
}));
