import { pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { momentNow } from './columns';
import { sequenceRevisions } from './sequence-revisions';

/** Who has a draft open, a row a browser tab. A row not renewed for 15 s means nothing. */
export const draftEditors = pgTable(
  'draft_editors',
  {
    revisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id, { onDelete: 'cascade' }),
    tabId: text().notNull(),
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    /** Step that has the focus. Null: none. */
    stepId: text(),
    seenAt: momentNow(),
  },
  (t) => [primaryKey({ columns: [t.revisionId, t.tabId] })],
);
