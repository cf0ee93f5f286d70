import { relations, sql } from 'drizzle-orm';
import { boolean, check, jsonb, pgEnum, pgTable, smallint, text, uuid } from 'drizzle-orm/pg-core';
import type { StationLink } from '@/lib/contracts/station-link';
import { stationSchemes } from '@/lib/contracts/stored-states';
import { id, moment, momentNow } from './columns';
import { instruments } from './instruments';
import { printers } from './printers';

export const stationSchemeEnum = pgEnum('station_scheme', stationSchemes);

/** A bench with its supply, multimeter, fixture and screen. */
export const stations = pgTable(
  'stations',
  {
    id: id(),
    /** Part of the bench's address, such as S1. */
    code: text().notNull().unique(),
    name: text().notNull(),
    /** The fixture standing on it. */
    fixture: text().notNull(),
    scheme: stationSchemeEnum().notNull().default('system'),
    /** Checked by lib/contracts/station-link.ts. */
    link: jsonb().$type<StationLink>().notNull(),
    /** Whether channel 104 reaches the trimmer's wiper. */
    hasWiperProbe: boolean().notNull().default(false),
    /** The whole text of the barcode on its red bin. */
    binCode: text().notNull().unique(),
    /** Null: labels wait until a printer is chosen. */
    printerId: uuid().references(() => printers.id),
    /** 50 or 60; integration is counted in its cycles. */
    mainsHz: smallint().notNull().default(50),
    createdAt: momentNow(),
    /** Null: in use. */
    retiredAt: moment(),
  },
  (t) => [check('stations_mains', sql`${t.mainsHz} in (50, 60)`)],
);

export const stationRelations = relations(stations, ({ one, many }) => ({
  printer: one(printers, { fields: [stations.printerId], references: [printers.id] }),
  instruments: many(instruments),
}));
