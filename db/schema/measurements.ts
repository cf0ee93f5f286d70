import { relations } from 'drizzle-orm';
import { boolean, doublePrecision, index, integer, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import type { Measurement } from '@/lib/run/types';
import { runs } from './runs';

/** One finished measurement of a run, with the limits it was judged by. Units follow from the quantity's name. */
export const measurements = pgTable(
  'measurements',
  {
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    /** Counts the measurements of a run from 0. */
    n: integer().notNull(),
    quantity: text().$type<Measurement['quantity']>().notNull(),
    phase: text().$type<Measurement['phase']>().notNull(),
    value: doublePrecision().notNull(),
    /** One standard deviation. Null: not stated. */
    standardUncertainty: doublePrecision(),
    /** U, for a coverage of about 95 %. Null: not stated. */
    expandedUncertainty: doublePrecision(),
    /** Null: no limit on this side. */
    min: doublePrecision(),
    max: doublePrecision(),
    /** The limits drawn in by the guard band. Null: no limit on this side. */
    guardedMin: doublePrecision(),
    guardedMax: doublePrecision(),
    /** Null: not judged. */
    passed: boolean(),
    stepIndex: integer().notNull(),
    /** Supply settles it took. Null: not a search. */
    settles: integer(),
  },
  (t) => [primaryKey({ columns: [t.runId, t.n] }), index().on(t.quantity, t.phase)],
);

export const measurementRelations = relations(measurements, ({ one }) => ({
  run: one(runs, { fields: [measurements.runId], references: [runs.id] }),
}));
