import { relations, sql } from 'drizzle-orm';
import { boolean, index, integer, jsonb, pgEnum, pgTable, text, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { DryRunResult, DryRunSettings } from '@/lib/contracts/dry-run';
import { dryRunStates } from '@/lib/contracts/stored-states';
import type { BoardType } from '@/lib/contracts/board-type';
import type { Sequence } from '@/lib/sequence/step';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { sequenceRevisions } from './sequence-revisions';

export const dryRunStateEnum = pgEnum('dry_run_state', dryRunStates);

/** A draft tried on simulated boards. Holds what it ran on, since the draft goes on changing. */
export const dryRuns = pgTable(
  'dry_runs',
  {
    id: id(),
    revisionId: uuid()
      .notNull()
      .references(() => sequenceRevisions.id),
    draftVersion: integer().notNull(),
    sequence: jsonb().$type<Sequence>().notNull(),
    boardType: jsonb().$type<BoardType>().notNull(),
    /** Null: nothing was released then. */
    releasedRevisionId: uuid().references(() => sequenceRevisions.id),
    settings: jsonb().$type<DryRunSettings>().notNull(),
    state: dryRunStateEnum().notNull().default('waiting'),
    /** Boards done, of both revisions and every single change. */
    done: integer().notNull().default(0),
    of: integer().notNull(),
    /** As far as it has come; whole when done. Null: nothing yet. */
    result: jsonb().$type<DryRunResult>(),
    /** Null: it did not fail. */
    problem: text(),
    /** Belongs to the revision and is shown where it is released; one that is not kept goes with the next. */
    kept: boolean().notNull().default(false),
    askedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    askedAt: momentNow(),
    startedAt: moment(),
    endedAt: moment(),
  },
  (t) => [
    index().on(t.revisionId, t.askedAt),
    uniqueIndex('dry_runs_one_at_work')
      .on(t.revisionId)
      .where(sql`${t.state} in ('waiting', 'running')`),
  ],
);

export const dryRunRelations = relations(dryRuns, ({ one }) => ({
  revision: one(sequenceRevisions, { fields: [dryRuns.revisionId], references: [sequenceRevisions.id] }),
  asker: one(accounts, { fields: [dryRuns.askedBy], references: [accounts.id] }),
}));
