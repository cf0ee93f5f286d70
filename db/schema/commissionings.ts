import { index, doublePrecision, pgTable, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { referenceBoards } from './reference-boards';
import { stations } from './stations';

/** What commissioning measured of a station. The newest counts until it expires; without one the station refuses to search. */
export const commissionings = pgTable(
  'commissionings',
  {
    id: id(),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    referenceBoardId: uuid()
      .notNull()
      .references(() => referenceBoards.id),
    /** Bound `u` on the largest move toward the known point that does not flip it, as a fraction of the step. */
    overshoot: doublePrecision().notNull(),
    settleMs: doublePrecision().notNull(),
    waypointMs: doublePrecision().notNull(),
    noiseVolts: doublePrecision().notNull(),
    at: momentNow(),
    validUntil: moment().notNull(),
    byAccountId: uuid()
      .notNull()
      .references(() => accounts.id),
  },
  (t) => [index().on(t.stationId, t.at)],
);
