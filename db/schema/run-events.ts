import { integer, jsonb, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';
import type { RunEvent } from '@/lib/run/types';
import { momentNow } from './columns';
import { runs } from './runs';

/** The events of a run in the order they happened, several to a row. Replaying them gives the run again. */
export const runEvents = pgTable(
  'run_events',
  {
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    /** Counts the rows of a run from 0; writing a row twice is refused, so nothing is stored twice. */
    n: integer().notNull(),
    batch: jsonb().$type<RunEvent[]>().notNull(),
    at: momentNow(),
  },
  (t) => [primaryKey({ columns: [t.runId, t.n] })],
);
