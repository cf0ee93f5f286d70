import { sql } from 'drizzle-orm';
import { check, index, jsonb, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { holdCauses } from '@/lib/contracts/stored-states';
import type { HoldDetail } from '@/lib/contracts/lot-hold';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { lots } from './lots';
import { runs } from './runs';
import { signatures } from './signatures';

export const holdCauseEnum = pgEnum('hold_cause', holdCauses);

/** Every hold of a lot, by a person or by rule. Finished once by its release, and changed in nothing else. */
export const lotHolds = pgTable(
  'lot_holds',
  {
    id: id(),
    lotId: uuid()
      .notNull()
      .references(() => lots.id),
    cause: holdCauseEnum().notNull(),
    /** Null: by rule. */
    raisedBy: uuid().references(() => accounts.id),
    raisedAt: momentNow(),
    /** The sentence that bench and desk show. */
    reason: text().notNull(),
    /** What the rule saw. Null: by a person. */
    detail: jsonb().$type<HoldDetail>(),
    /** The run after which it was raised. Null: by a person. */
    runId: uuid().references(() => runs.id),
    /** Null: still on hold. */
    releasedAt: moment(),
    releasedBy: uuid().references(() => accounts.id),
    releaseReason: text(),
    signatureId: uuid().references(() => signatures.id),
  },
  (t) => [
    index().on(t.lotId, t.raisedAt),
    check('lot_holds_by_person', sql`(${t.cause} = 'person') = (${t.raisedBy} is not null)`),
    check('lot_holds_released_signed', sql`(${t.releasedAt} is null) = (${t.signatureId} is null)`),
  ],
);
