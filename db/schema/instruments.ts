import { relations } from 'drizzle-orm';
import { index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { instrumentKinds } from '@/lib/contracts/stored-states';
import { calibrations } from './calibrations';
import { id, moment, momentNow } from './columns';
import { stations } from './stations';

export const instrumentKindEnum = pgEnum('instrument_kind', instrumentKinds);

/** A supply, multimeter or fixture controller, known by the code on its sticker. */
export const instruments = pgTable(
  'instruments',
  {
    id: id(),
    code: text().notNull().unique(),
    kind: instrumentKindEnum().notNull(),
    /** Null: in the store. */
    stationId: uuid().references(() => stations.id),
    /** The whole answer to *IDN? that the station must get. Null: not recorded yet, any answer is taken. */
    expectedIdentity: text(),
    /** Name of the command set it speaks, see stations/instruments. */
    commandSet: text().notNull().default('scpi-1999'),
    createdAt: momentNow(),
    /** Null: in use. */
    retiredAt: moment(),
  },
  (t) => [index().on(t.stationId)],
);

export const instrumentRelations = relations(instruments, ({ one, many }) => ({
  station: one(stations, { fields: [instruments.stationId], references: [stations.id] }),
  calibrations: many(calibrations),
}));
