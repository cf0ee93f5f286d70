import { relations } from 'drizzle-orm';
import { doublePrecision, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { boardTypes } from './board-types';
import { id, moment, momentNow } from './columns';

/** A board of known points, kept for daily checks and commissioning. Volts. */
export const referenceBoards = pgTable('reference_boards', {
  id: id(),
  /** Scanned like a serial number. */
  code: text().notNull().unique(),
  boardTypeId: uuid()
    .notNull()
    .references(() => boardTypes.id),
  tripVolts: doublePrecision().notNull(),
  releaseVolts: doublePrecision().notNull(),
  /** Either point may differ by this much from the known one. */
  toleranceVolts: doublePrecision().notNull(),
  createdAt: momentNow(),
  /** Null: in use. */
  retiredAt: moment(),
});

export const referenceBoardRelations = relations(referenceBoards, ({ one }) => ({
  boardType: one(boardTypes, { fields: [referenceBoards.boardTypeId], references: [boardTypes.id] }),
}));
