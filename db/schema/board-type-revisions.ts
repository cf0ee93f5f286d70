import { relations, sql } from 'drizzle-orm';
import { check, integer, jsonb, pgEnum, pgTable, text, unique, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { BoardType } from '@/lib/contracts/board-type';
import { boardTypeRevisionStates } from '@/lib/contracts/stored-states';
import { accounts } from './accounts';
import { boardTypes } from './board-types';
import { id, moment, momentNow } from './columns';

export const boardTypeRevisionStateEnum = pgEnum('board_type_revision_state', boardTypeRevisionStates);

/** One revision of a board type's circuit, limits and ranges. Not changed once approved. */
export const boardTypeRevisions = pgTable(
  'board_type_revisions',
  {
    id: id(),
    boardTypeId: uuid()
      .notNull()
      .references(() => boardTypes.id),
    number: integer().notNull(),
    /** Checked by lib/contracts/board-type.ts. */
    specification: jsonb().$type<BoardType>().notNull(),
    status: boardTypeRevisionStateEnum().notNull().default('draft'),
    madeBy: uuid()
      .notNull()
      .references(() => accounts.id),
    madeAt: momentNow(),
    /** Rises with every save of the draft; a save names the version it was made from. */
    version: integer().notNull().default(1),
    savedAt: momentNow(),
    /** Everyone who changed the draft: none of them may approve it. */
    editedBy: uuid().array().notNull().default([]),
    /** What changed and why. */
    note: text().notNull().default(''),
    submittedBy: uuid().references(() => accounts.id),
    submittedAt: moment(),
    /** Null: not sent back since it was last submitted. */
    sentBackBy: uuid().references(() => accounts.id),
    sentBackAt: moment(),
    sentBackReason: text(),
    /** Null: nobody has approved the limits yet. Never the maker. */
    approvedBy: uuid().references(() => accounts.id),
    approvedAt: moment(),
    /** Null: no newer revision is approved. */
    supersededAt: moment(),
  },
  (t) => [
    unique().on(t.boardTypeId, t.number),
    uniqueIndex('board_type_revisions_one_draft')
      .on(t.boardTypeId)
      .where(sql`${t.status} in ('draft', 'submitted')`),
    check('board_type_revisions_not_edited', sql`${t.approvedBy} <> all (${t.editedBy})`),
    check('board_type_revisions_not_own', sql`${t.approvedBy} <> ${t.madeBy}`),
    check('board_type_revisions_approved', sql`${t.status} <> 'approved' or ${t.approvedBy} is not null`),
  ],
);

export const boardTypeRevisionRelations = relations(boardTypeRevisions, ({ one }) => ({
  boardType: one(boardTypes, { fields: [boardTypeRevisions.boardTypeId], references: [boardTypes.id] }),
}));
