import { pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { momentNow } from './columns';
import { mailTopicEnum } from './mails';

/** Who hears of what by mail. */
export const mailSubscriptions = pgTable(
  'mail_subscriptions',
  {
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    topic: mailTopicEnum().notNull(),
    since: momentNow(),
  },
  (t) => [primaryKey({ columns: [t.accountId, t.topic] })],
);
