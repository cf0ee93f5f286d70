import { pgEnum, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { reasonCodeUses } from '@/lib/contracts/stored-states';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';

export const reasonCodeUseEnum = pgEnum('reason_code_use', reasonCodeUses);

/** A reason that people choose from. Records keep the word as it was when they were made. */
export const reasonCodes = pgTable(
  'reason_codes',
  {
    id: id(),
    use: reasonCodeUseEnum().notNull(),
    word: text().notNull(),
    createdBy: uuid()
      .notNull()
      .references(() => accounts.id),
    createdAt: momentNow(),
    /** Null: may be chosen. */
    retiredAt: moment(),
    /** The code that counts in its place from now on. Null: not merged. A merged one is retired. */
    mergedIntoId: uuid(),
  },
  (t) => [unique().on(t.use, t.word)],
);
