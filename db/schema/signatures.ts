import { index, jsonb, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';

/**
 * Signed with the password at the moment of signing. Bound to exactly what was signed: `content` in canonical JSON (RFC 8785), and
 * its SHA-256. Never changed.
 */
export const signatures = pgTable(
  'signatures',
  {
    id: id(),
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    /** As it was when signed. */
    name: text().notNull(),
    signedAt: momentNow(),
    /** The words that were agreed to. */
    meaning: text().notNull(),
    /** Kind and id of what was signed, such as disposition. */
    subject: text().notNull(),
    subjectId: text().notNull(),
    content: jsonb().$type<Record<string, unknown>>().notNull(),
    /** Hexadecimal SHA-256 of the canonical JSON of `content`. */
    digest: text().notNull(),
  },
  (t) => [index().on(t.subject, t.subjectId)],
);
