import { relations } from 'drizzle-orm';
import { index, pgTable, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { boardTypes } from './board-types';
import { id, moment, momentNow } from './columns';

/** A person was trained for a board type. The latest `validUntil` counts. */
export const trainings = pgTable(
  'trainings',
  {
    id: id(),
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    validUntil: moment().notNull(),
    recordedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    recordedAt: momentNow(),
  },
  (t) => [index().on(t.accountId, t.boardTypeId)],
);

export const trainingRelations = relations(trainings, ({ one }) => ({
  account: one(accounts, { fields: [trainings.accountId], references: [accounts.id], relationName: 'trained' }),
  boardType: one(boardTypes, { fields: [trainings.boardTypeId], references: [boardTypes.id] }),
}));
