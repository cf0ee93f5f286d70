import { relations, sql } from 'drizzle-orm';
import { check, pgEnum, pgTable, text } from 'drizzle-orm/pg-core';
import { roles } from '@/lib/access/roles';
import { id, moment, momentNow } from './columns';
import { sessions } from './sessions';
import { trainings } from './trainings';

export const roleEnum = pgEnum('role', roles);

/** A person who may sign in. Never deleted, since records name it: disabled instead. */
export const accounts = pgTable(
  'accounts',
  {
    id: id(),
    name: text().notNull(),
    /** Lower case. Null: cannot sign in at a desk. */
    email: text().unique(),
    /** Printed on the badge and shown at the bench, such as 14. Null: not an operator. */
    operatorNumber: text().unique(),
    /** The whole text of the badge barcode, prefix included. Null: no badge. */
    badgeCode: text().unique(),
    /** argon2id. Null: no password chosen yet. */
    passwordHash: text(),
    /** argon2id. Null: no PIN chosen yet. */
    pinHash: text(),
    roles: roleEnum().array().notNull(),
    /** Language of the bench, BCP 47. */
    locale: text().notNull().default('en'),
    createdAt: momentNow(),
    /** Null: the account works. */
    disabledAt: moment(),
  },
  (t) => [check('accounts_email_lower', sql`${t.email} = lower(${t.email})`)],
);

export const accountRelations = relations(accounts, ({ many }) => ({
  sessions: many(sessions),
  trainings: many(trainings, { relationName: 'trained' }),
}));
