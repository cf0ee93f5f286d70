import { relations, sql } from 'drizzle-orm';
import { check, integer, jsonb, pgEnum, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core';
import { sequenceRevisionStates } from '@/lib/contracts/stored-states';
import type { Sequence } from '@/lib/sequence/step';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { sequences } from './sequences';

export const sequenceRevisionStateEnum = pgEnum('sequence_revision_state', sequenceRevisionStates);

/** One revision of a sequence. Not changed once released. */
export const sequenceRevisions = pgTable(
  'sequence_revisions',
  {
    id: id(),
    sequenceId: uuid()
      .notNull()
      .references(() => sequences.id),
    /** 7 is shown as r7. */
    number: integer().notNull(),
    /** Checked by lib/sequence/step.ts. */
    data: jsonb().$type<Sequence>().notNull(),
    status: sequenceRevisionStateEnum().notNull().default('draft'),
    /** What changed and why. */
    note: text().notNull().default(''),
    madeBy: uuid()
      .notNull()
      .references(() => accounts.id),
    madeAt: momentNow(),
    submittedAt: moment(),
    /** Null: not released. Another engineer or quality, never the maker. */
    releasedBy: uuid().references(() => accounts.id),
    releasedAt: moment(),
    withdrawnAt: moment(),
  },
  (t) => [
    unique().on(t.sequenceId, t.number),
    check('sequence_revisions_not_own', sql`${t.releasedBy} <> ${t.madeBy}`),
    check('sequence_revisions_released', sql`${t.status} <> 'released' or ${t.releasedBy} is not null`),
  ],
);

export const sequenceRevisionRelations = relations(sequenceRevisions, ({ one }) => ({
  sequence: one(sequences, { fields: [sequenceRevisions.sequenceId], references: [sequences.id] }),
}));
