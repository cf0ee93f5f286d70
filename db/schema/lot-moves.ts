import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';
import { lots } from './lots';
import { sequenceRevisions } from './sequence-revisions';

/** An open lot moved to another revision of its sequence: a decision with a reason. */
export const lotMoves = pgTable(
  'lot_moves',
  {
    id: id(),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    fromRevisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id),
    toRevisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id),
    reason: text().notNull(),
    movedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    movedAt: momentNow(),
  },
  (t) => [index().on(t.lotId, t.movedAt)],
);
