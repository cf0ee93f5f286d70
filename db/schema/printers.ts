import { pgTable, text } from 'drizzle-orm/pg-core';
import { id, moment, momentNow } from './columns';

/** A label printer reached by IPP. */
export const printers = pgTable('printers', {
  id: id(),
  name: text().notNull().unique(),
  /** ipp:// or ipps:// address. */
  uri: text().notNull(),
  createdAt: momentNow(),
  /** Null: in use. */
  retiredAt: moment(),
});
