import { relations, sql } from 'drizzle-orm';
import { check, date, index, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { accounts } from './accounts';
import { id, momentNow } from './columns';
import { instruments } from './instruments';

/** One calibration certificate of an instrument. The newest by `calibratedOn` counts. */
export const calibrations = pgTable(
  'calibrations',
  {
    id: id(),
    instrumentId: uuid()
      .notNull()
      .references(() => instruments.id),
    calibratedOn: date({ mode: 'string' }).notNull(),
    /** The last day on which it may be used. */
    dueOn: date({ mode: 'string' }).notNull(),
    certificateNumber: text().notNull(),
    enteredBy: uuid()
      .notNull()
      .references(() => accounts.id),
    enteredAt: momentNow(),
  },
  (t) => [
    index().on(t.instrumentId, t.calibratedOn),
    check('calibrations_due_after', sql`${t.dueOn} > ${t.calibratedOn}`),
  ],
);

export const calibrationRelations = relations(calibrations, ({ one }) => ({
  instrument: one(instruments, { fields: [calibrations.instrumentId], references: [instruments.id] }),
}));
