import { relations, sql } from 'drizzle-orm';
import { index, jsonb, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { BoardType } from '@/lib/contracts/board-type';
import type { Sequence } from '@/lib/sequence/step';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { sequenceRevisions } from './sequence-revisions';
import { stations } from './stations';

/**
 * A draft offered to a station. Only an act at that bench starts a run of it; every run is an engineering run. Holds the draft as
 * it was offered. Open until somebody ends it.
 */
export const engineeringOffers = pgTable(
  'engineering_offers',
  {
    id: id(),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    revisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id),
    boardTypeId: uuid().notNull(),
    sequence: jsonb().$type<Sequence>().notNull(),
    boardType: jsonb().$type<BoardType>().notNull(),
    /** What the bench should know. Empty: nothing. */
    note: text().notNull().default(''),
    offeredBy: uuid()
      .notNull()
      .references(() => accounts.id),
    offeredAt: momentNow(),
    /** Null: the bench may take it. */
    endedAt: moment(),
    endedBy: uuid().references(() => accounts.id),
  },
  (t) => [
    index().on(t.revisionId),
    uniqueIndex('engineering_offers_one_open')
      .on(t.stationId)
      .where(sql`${t.endedAt} is null`),
  ],
);

export const engineeringOfferRelations = relations(engineeringOffers, ({ one }) => ({
  station: one(stations, { fields: [engineeringOffers.stationId], references: [stations.id] }),
  revision: one(sequenceRevisions, { fields: [engineeringOffers.revisionId], references: [sequenceRevisions.id] }),
}));
