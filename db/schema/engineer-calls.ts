import { sql } from 'drizzle-orm';
import { pgTable, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { runs } from './runs';
import { stations } from './stations';

/** A bench calls an engineer; desks show it until someone acknowledges it. One open call a station. */
export const engineerCalls = pgTable(
  'engineer_calls',
  {
    id: id(),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    /** Null: no run was open. */
    runId: uuid().references(() => runs.id),
    at: momentNow(),
    /** Null: nobody was signed in at the bench. */
    byAccountId: uuid().references(() => accounts.id),
    acknowledgedBy: uuid().references(() => accounts.id),
    /** Null: still calling. */
    acknowledgedAt: moment(),
  },
  (t) => [
    uniqueIndex('engineer_calls_one_open')
      .on(t.stationId)
      .where(sql`${t.acknowledgedAt} is null`),
  ],
);
