import { date, doublePrecision, integer, jsonb, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';
import { boardTypes } from './board-types';
import { lots } from './lots';
import { stations } from './stations';

/** Count, mean and sum of squared deviations of one quantity's verified values of first runs with a verdict; merged exactly as by Chan, Golub and LeVeque (1983). */
export interface RolledQuantity {
  count: number;
  mean: number;
  squares: number;
  min: number;
  max: number;
}

/** Production runs rolled up by day in the site's time zone, lot and station: what long-range pages are drawn from. */
export const yieldDays = pgTable(
  'yield_days',
  {
    day: date({ mode: 'string' }).notNull(),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    firstRuns: integer().notNull().default(0),
    firstPasses: integer().notNull().default(0),
    laterPasses: integer().notNull().default(0),
    rejects: integer().notNull().default(0),
    noVerdicts: integer().notNull().default(0),
    seconds: doublePrecision().notNull().default(0),
    /** Rejects of first runs by reason. */
    reasons: jsonb().$type<Record<string, number>>().notNull().default({}),
    trip: jsonb().$type<RolledQuantity>(),
    release: jsonb().$type<RolledQuantity>(),
    hysteresis: jsonb().$type<RolledQuantity>(),
  },
  (t) => [primaryKey({ columns: [t.lotId, t.stationId, t.day] })],
);
