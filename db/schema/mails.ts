import { index, integer, jsonb, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { mailStates, mailTopics } from '@/lib/contracts/stored-states';
import type { MailAttachment } from '@/lib/contracts/mail';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';

export const mailStateEnum = pgEnum('mail_state', mailStates);
export const mailTopicEnum = pgEnum('mail_topic', mailTopics);

/** One mail to one person for one cause. Its job is made in the transaction of what caused it. */
export const mails = pgTable(
  'mails',
  {
    id: id(),
    topic: mailTopicEnum().notNull(),
    /** Names cause and person: the same cause never makes a second mail. */
    causeKey: text().notNull().unique(),
    /** Message-ID, made from the cause: a mail sent twice after a crash is seen as one. */
    messageId: text().notNull().unique(),
    /** Null: an address that is nobody's account, such as a customer's. */
    accountId: uuid().references(() => accounts.id),
    toAddress: text().notNull(),
    subject: text().notNull(),
    text: text().notNull(),
    attachments: jsonb().$type<MailAttachment[]>().notNull().default([]),
    state: mailStateEnum().notNull().default('waiting'),
    tries: integer().notNull().default(0),
    /** What the mail server said last. Null: nothing yet. */
    answer: text(),
    writtenAt: momentNow(),
    /** Null: not tried yet, or not to be tried again. */
    nextTryAt: moment(),
    sentAt: moment(),
  },
  (t) => [index().on(t.writtenAt), index().on(t.state)],
);
