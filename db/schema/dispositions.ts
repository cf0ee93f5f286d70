import { relations, sql } from 'drizzle-orm';
import { check, index, pgEnum, pgTable, text, uuid } from 'drizzle-orm/pg-core';
import { dispositionKinds } from '@/lib/contracts/stored-states';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { reasonCodes } from './reason-codes';
import { runs } from './runs';
import { signatures } from './signatures';
import { units } from './units';

export const dispositionKindEnum = pgEnum('disposition_kind', dispositionKinds);

/** What was decided about a board after a run, signed. A retest of a rejected board needs a rework after that reject. */
export const dispositions = pgTable(
  'dispositions',
  {
    id: id(),
    unitId: uuid()
      .notNull()
      .references(() => units.id),
    /** The run it answers. */
    runId: uuid()
      .notNull()
      .references(() => runs.id),
    kind: dispositionKindEnum().notNull(),
    /** What was done to the board, or is to be done. Empty for scrap and concession. */
    action: text().notNull().default(''),
    reason: text().notNull(),
    /** Null: signed before reasons were kept as codes. The word as it was stands in `reasonWord`. */
    reasonCodeId: uuid().references(() => reasonCodes.id),
    reasonWord: text(),
    /** Null: signed before signatures were bound to what they sign. */
    signatureId: uuid().references(() => signatures.id),
    secondSignatureId: uuid().references(() => signatures.id),
    signedBy: uuid()
      .notNull()
      .references(() => accounts.id),
    signedAt: momentNow(),
    /** A concession needs quality and an engineer. Null: not needed, or not signed yet. */
    secondSignedBy: uuid().references(() => accounts.id),
    secondSignedAt: moment(),
  },
  (t) => [
    index().on(t.unitId),
    index().on(t.runId),
    check('dispositions_two_people', sql`${t.secondSignedBy} <> ${t.signedBy}`),
    check('dispositions_rework_says_what', sql`${t.kind} <> 'rework' or length(${t.action}) > 0`),
  ],
);

export const dispositionRelations = relations(dispositions, ({ one }) => ({
  unit: one(units, { fields: [dispositions.unitId], references: [units.id] }),
  run: one(runs, { fields: [dispositions.runId], references: [runs.id] }),
  signer: one(accounts, { fields: [dispositions.signedBy], references: [accounts.id] }),
}));
