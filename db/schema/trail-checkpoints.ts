import { bigint, index, pgTable, text } from 'drizzle-orm/pg-core';
import { id, moment, momentNow } from './columns';

/** The head of a chain of the trail as it was sent out: whoever holds it can tell whether entries up to it were changed. */
export const trailCheckpoints = pgTable(
  'trail_checkpoints',
  {
    id: id(),
    /** desk, or a station's code. */
    chain: text().notNull(),
    /** Place of the head in its chain, from 1. */
    place: bigint({ mode: 'number' }).notNull(),
    seal: text().notNull(),
    writtenAt: momentNow(),
    /** Key in object storage. Null: not there yet. */
    storageKey: text(),
    storedAt: moment(),
    /** With a shift report. Null: not yet. */
    mailedAt: moment(),
  },
  (t) => [index().on(t.chain, t.place)],
);
