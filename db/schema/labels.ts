import { relations } from 'drizzle-orm';
import { index, integer, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { labelStates } from '@/lib/contracts/stored-states';
import { id, moment, momentNow } from './columns';
import { printers } from './printers';
import { runs } from './runs';
import { units } from './units';

export const labelStateEnum = pgEnum('label_state', labelStates);

/** A label asked for after a pass, or a reprint of one. */
export const labels = pgTable(
  'labels',
  {
    id: id(),
    unitId: uuid()
      .notNull()
      .references(() => units.id),
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    /** Null: the station has no printer, so the label waits. */
    printerId: uuid().references(() => printers.id),
    state: labelStateEnum().notNull().default('waiting'),
    /** The printer's last complaint, as a sentence. Null: none. */
    problem: text(),
    tries: integer().notNull().default(0),
    /** The sender leaves it alone until then. Null: at once. */
    nextTryAt: moment(),
    /** The printer's own number of the job it took. Null: not taken yet. */
    printerJobId: integer(),
    createdAt: momentNow(),
    printedAt: moment(),
  },
  (t) => [index().on(t.state), index().on(t.unitId), index().on(t.runId)],
);

export const labelRelations = relations(labels, ({ one }) => ({
  unit: one(units, { fields: [labels.unitId], references: [units.id] }),
  printer: one(printers, { fields: [labels.printerId], references: [printers.id] }),
}));
