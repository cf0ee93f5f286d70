import { pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';

export const accountLinkKindEnum = pgEnum('account_link_kind', ['first-administrator', 'choose-password']);

/** A link that works once: makes the first administrator, or lets a person choose a password. */
export const accountLinks = pgTable('account_links', {
  id: id(),
  kind: accountLinkKindEnum().notNull(),
  /** SHA-256 of the token in the link, hexadecimal; the token itself is not kept. */
  tokenHash: text().notNull().unique(),
  /** Null for the first administrator, whose account does not exist yet. */
  accountId: uuid().references(() => accounts.id),
  createdAt: momentNow(),
  expiresAt: moment().notNull(),
  /** Null: not used yet. */
  usedAt: moment(),
});
