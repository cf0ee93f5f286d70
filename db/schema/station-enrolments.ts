import { index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { stations } from './stations';

/** A browser that may show a station's bench screen. Without it a badge and PIN are worth nothing. */
export const stationEnrolments = pgTable(
  'station_enrolments',
  {
    id: id(),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    /** SHA-256 of the token in the browser's cookie, hexadecimal. */
    tokenHash: text().notNull().unique(),
    enrolledBy: uuid()
      .notNull()
      .references(() => accounts.id),
    enrolledAt: momentNow(),
    /** Null: still enrolled. */
    revokedAt: moment(),
  },
  (t) => [index().on(t.stationId)],
);
