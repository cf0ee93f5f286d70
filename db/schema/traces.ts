import { relations, sql } from 'drizzle-orm';
import { check, integer, pgTable, primaryKey, real, smallint, text, uuid } from 'drizzle-orm/pg-core';
import { runs } from './runs';

/** Readings of one stretch of a run; the arrays are equally long. */
export const traces = pgTable(
  'traces',
  {
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    /** Counts the stretches of a run from 0. */
    n: integer().notNull(),
    /** What the station was doing, such as find-points, trim, verify. */
    kind: text().notNull(),
    /** Milliseconds since the run began. */
    atMs: real().array().notNull(),
    /** At the board's supply terminals, channel 101. */
    volts: real().array().notNull(),
    /** 1 on, 0 off, -1 not read. */
    output: smallint().array().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.runId, t.n] }),
    check(
      'traces_equal_lengths',
      sql`cardinality(${t.atMs}) = cardinality(${t.volts}) and cardinality(${t.volts}) = cardinality(${t.output})`,
    ),
  ],
);

export const traceRelations = relations(traces, ({ one }) => ({
  run: one(runs, { fields: [traces.runId], references: [runs.id] }),
}));
