import { relations, sql } from 'drizzle-orm';
import { check, integer, jsonb, pgEnum, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
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
    /** Null: begun from nothing. Otherwise the revision it was begun from or restores. */
    basedOnId: uuid(),
    /** Rises with every save of the draft; a save names the version it was made from. */
    version: integer().notNull().default(1),
    savedAt: momentNow(),
    /** Null: as it was begun. */
    savedBy: uuid().references(() => accounts.id),
    /** Everyone who changed the draft: none of them may release it. */
    editedBy: uuid().array().notNull().default([]),
    /** Why a warning is accepted, by its key (lib/sequence/finding.ts). */
    warningReasons: jsonb().$type<Record<string, string>>().notNull().default({}),
    submittedBy: uuid().references(() => accounts.id),
    submittedAt: moment(),
    /** Null: not sent back since it was last submitted. */
    sentBackBy: uuid().references(() => accounts.id),
    sentBackAt: moment(),
    sentBackReason: text(),
    /** Null: not released. Another engineer or quality, never the maker. */
    releasedBy: uuid().references(() => accounts.id),
    releasedAt: moment(),
    /** What the signature means, in the words that were signed. */
    releaseMeaning: text(),
    /** Null: no newer revision is released. */
    supersededAt: moment(),
    withdrawnBy: uuid().references(() => accounts.id),
    withdrawnAt: moment(),
    withdrawnReason: text(),
  },
  (t) => [
    unique().on(t.sequenceId, t.number),
    uniqueIndex('sequence_revisions_one_draft')
      .on(t.sequenceId)
      .where(sql`${t.status} in ('draft', 'submitted')`),
    check('sequence_revisions_not_edited', sql`${t.releasedBy} <> all (${t.editedBy})`),
    check('sequence_revisions_not_own', sql`${t.releasedBy} <> ${t.madeBy}`),
    check('sequence_revisions_released', sql`${t.status} <> 'released' or ${t.releasedBy} is not null`),
  ],
);

export const sequenceRevisionRelations = relations(sequenceRevisions, ({ one }) => ({
  sequence: one(sequences, { fields: [sequenceRevisions.sequenceId], references: [sequences.id] }),
}));
