import { relations } from 'drizzle-orm';
import { pgTable, text } from 'drizzle-orm/pg-core';
import { boardTypeRevisions } from './board-type-revisions';
import { id, momentNow } from './columns';

/** A kind of cutoff board. What it is stands in its revisions. */
export const boardTypes = pgTable('board_types', {
  id: id(),
  code: text().notNull().unique(),
  name: text().notNull(),
  createdAt: momentNow(),
});

export const boardTypeRelations = relations(boardTypes, ({ many }) => ({ revisions: many(boardTypeRevisions) }));
