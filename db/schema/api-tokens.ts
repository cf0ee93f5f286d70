import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';

/** A personal token of the interface for other systems. Shown once; kept as a hash. */
export const apiTokens = pgTable(
  'api_tokens',
  {
    id: id(),
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    name: text().notNull(),
    /** First characters, to tell tokens apart in the list. */
    start: text().notNull(),
    /** Hexadecimal SHA-256 of 256 random bits. */
    tokenHash: text().notNull().unique(),
    /** Of lib/contracts/api.ts. */
    scopes: text().array().notNull(),
    createdAt: momentNow(),
    expiresAt: moment().notNull(),
    /** Null: valid until it expires. */
    revokedAt: moment(),
    revokedBy: uuid().references(() => accounts.id),
    lastUsedAt: moment(),
  },
  (t) => [index().on(t.accountId)],
);
