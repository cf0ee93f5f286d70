import { relations, sql } from 'drizzle-orm';
import { check, index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { sessionKinds } from '@/lib/access/session-kinds';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { stations } from './stations';

export const sessionKindEnum = pgEnum('session_kind', sessionKinds);

/** One sign-in. Its id travels in the signed cookie and is looked up on every request and handshake. */
export const sessions = pgTable(
  'sessions',
  {
    id: id(),
    accountId: uuid()
      .notNull()
      .references(() => accounts.id),
    kind: sessionKindEnum().notNull(),
    /** Null: a desk session. */
    stationId: uuid().references(() => stations.id),
    createdAt: momentNow(),
    lastSeenAt: momentNow(),
    expiresAt: moment().notNull(),
    /** Null: not ended by anyone, though it may have expired. A trigger notifies `session_ended` with the id. */
    endedAt: moment(),
    /** Such as signed-out, disabled, replaced. Null while not ended. */
    endedBecause: text(),
  },
  (t) => [
    index().on(t.accountId),
    index()
      .on(t.stationId)
      .where(sql`${t.endedAt} is null`),
    check('sessions_bench_has_station', sql`(${t.kind} = 'bench') = (${t.stationId} is not null)`),
  ],
);

export const sessionRelations = relations(sessions, ({ one }) => ({
  account: one(accounts, { fields: [sessions.accountId], references: [accounts.id] }),
  station: one(stations, { fields: [sessions.stationId], references: [stations.id] }),
}));
