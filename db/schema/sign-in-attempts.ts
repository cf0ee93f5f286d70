import { index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { attemptOutcomes } from '@/lib/access/session-kinds';
import { id, momentNow } from './columns';
import { stations } from './stations';

export const attemptOutcomeEnum = pgEnum('attempt_outcome', attemptOutcomes);

/** Every try to sign in, so that waits grow and at most ten are evaluated in 15 minutes. */
export const signInAttempts = pgTable(
  'sign_in_attempts',
  {
    id: id(),
    /** The e-mail or badge code given, whether or not an account has it. */
    identifier: text().notNull(),
    /** Null: at a desk. */
    stationId: uuid().references(() => stations.id),
    at: momentNow(),
    outcome: attemptOutcomeEnum().notNull(),
  },
  (t) => [index().on(t.identifier, t.stationId, t.at)],
);
