import { relations } from 'drizzle-orm';
import { pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { boardTypes } from './board-types';
import { id, momentNow } from './columns';
import { sequenceRevisions } from './sequence-revisions';

/** A test sequence for one board type. Its steps stand in its revisions. */
export const sequences = pgTable(
  'sequences',
  {
    id: id(),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    name: text().notNull(),
    createdAt: momentNow(),
  },
  (t) => [unique().on(t.boardTypeId, t.name)],
);

export const sequenceRelations = relations(sequences, ({ one, many }) => ({
  boardType: one(boardTypes, { fields: [sequences.boardTypeId], references: [boardTypes.id] }),
  revisions: many(sequenceRevisions),
}));
