import { relations } from 'drizzle-orm';
import { integer, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { id, moment } from './columns';
import { dispositions } from './dispositions';
import { lots } from './lots';
import { runs } from './runs';

/** One board. */
export const units = pgTable(
  'units',
  {
    id: id(),
    serial: text().notNull().unique(),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    /** Place in the lot, from 1. */
    position: integer().notNull(),
    /** Null: not scrapped. */
    scrappedAt: moment(),
  },
  (t) => [unique().on(t.lotId, t.position)],
);

export const unitRelations = relations(units, ({ one, many }) => ({
  lot: one(lots, { fields: [units.lotId], references: [lots.id] }),
  runs: many(runs),
  dispositions: many(dispositions),
}));
