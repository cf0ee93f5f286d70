import { boolean, doublePrecision, index, pgTable, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';
import { referenceBoards } from './reference-boards';
import { runs } from './runs';
import { stations } from './stations';

/** A measurement of the reference board on a station. The newest counts, for `validHours` after `at` and only when passed. */
export const dailyChecks = pgTable(
  'daily_checks',
  {
    id: id(),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    referenceBoardId: uuid()
      .notNull()
      .references(() => referenceBoards.id),
    /** Null: entered by hand, without a recorded run. */
    runId: uuid().references(() => runs.id),
    /** Null: the point was not found. */
    tripVolts: doublePrecision(),
    /** Null: the point was not found. */
    releaseVolts: doublePrecision(),
    passed: boolean().notNull(),
    at: momentNow(),
    /** Hours, not a calendar day: a shift over midnight keeps its check. */
    validHours: doublePrecision().notNull(),
    byAccountId: uuid()
      .notNull()
      .references(() => accounts.id),
  },
  (t) => [index().on(t.stationId, t.at)],
);
