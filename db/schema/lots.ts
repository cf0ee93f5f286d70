import { relations, sql } from 'drizzle-orm';
import { check, index, integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { lotStates } from '@/lib/contracts/stored-states';
import { accounts } from './accounts';
import { boardTypeRevisions } from './board-type-revisions';
import { id, moment, momentNow } from './columns';
import { lotComponents } from './lot-components';
import { sequenceRevisions } from './sequence-revisions';
import { units } from './units';

export const lotStateEnum = pgEnum('lot_state', lotStates);

/** Boards made and tested together, under one specification and one sequence. */
export const lots = pgTable(
  'lots',
  {
    id: id(),
    /** Printed on the lot sheet; the sheet's barcode puts our prefix before it. */
    code: text().notNull().unique(),
    boardTypeRevisionId: uuid()
      .notNull()
      .references(() => boardTypeRevisions.id),
    sequenceRevisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id),
    /** Boards in the lot. */
    size: integer().notNull(),
    state: lotStateEnum().notNull().default('open'),
    /** Null: not on hold. A held lot is not tested, whatever its state. */
    heldAt: moment(),
    /** Null: not on hold, or held by rule; the holds are in lot_holds. */
    heldBy: uuid().references(() => accounts.id),
    holdReason: text(),
    createdBy: uuid()
      .notNull()
      .references(() => accounts.id),
    createdAt: momentNow(),
    closedAt: moment(),
  },
  (t) => [
    index().on(t.state),
    check('lots_size', sql`${t.size} > 0`),
    check(
      'lots_hold',
      sql`(${t.heldBy} is null or ${t.heldAt} is not null) and (${t.heldAt} is null) = (${t.holdReason} is null)`,
    ),
  ],
);

export const lotRelations = relations(lots, ({ one, many }) => ({
  boardTypeRevision: one(boardTypeRevisions, {
    fields: [lots.boardTypeRevisionId],
    references: [boardTypeRevisions.id],
  }),
  sequenceRevision: one(sequenceRevisions, {
    fields: [lots.sequenceRevisionId],
    references: [sequenceRevisions.id],
  }),
  units: many(units),
  components: many(lotComponents),
}));
