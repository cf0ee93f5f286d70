import { relations, sql } from 'drizzle-orm';
import {
  boolean,
  check,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  text,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { runClosers, runKinds, supplyOffWitnesses } from '@/lib/contracts/stored-states';
import {
  likelyCauses,
  noVerdictReasons,
  rejectReasons,
  verdicts,
  type Adjustment,
  type RunPlan,
} from '@/lib/run/types';
import { accounts } from './accounts';
import { id, moment, momentNow } from './columns';
import { engineeringOffers } from './engineering-offers';
import { lots } from './lots';
import { measurements } from './measurements';
import { referenceBoards } from './reference-boards';
import { stations } from './stations';
import { traces } from './traces';
import { units } from './units';

export const runKindEnum = pgEnum('run_kind', runKinds);
export const verdictEnum = pgEnum('verdict', verdicts);
export const runCloserEnum = pgEnum('run_closer', runClosers);
export const supplyOffWitnessEnum = pgEnum('supply_off_witness', supplyOffWitnesses);

/**
 * One board on one fixture from scan to verdict. Written at the start and once more at the end; from then on a trigger
 * refuses every change but the single scan of the red bin. Its events, traces and measurements are written before it ends.
 */
export const runs = pgTable(
  'runs',
  {
    id: id(),
    kind: runKindEnum().notNull(),
    /** Null: a reference board, not a unit of a lot. */
    unitId: uuid().references(() => units.id),
    /** Null: not a unit of a lot. */
    lotId: uuid().references(() => lots.id),
    /** Null: a unit of a lot. */
    referenceBoardId: uuid().references(() => referenceBoards.id),
    /** Of an engineering run. Null: any other. */
    offerId: uuid().references(() => engineeringOffers.id),
    stationId: uuid()
      .notNull()
      .references(() => stations.id),
    operatorId: uuid()
      .notNull()
      .references(() => accounts.id),
    /** 1 for the first run of a unit. */
    attempt: integer().notNull(),
    /** Everything fixed at the start; lib/run/types.ts. */
    plan: jsonb().$type<RunPlan>().notNull(),
    startedAt: momentNow(),
    /** Null: the run is open. */
    endedAt: moment(),
    /** Null: the run is open. */
    verdict: verdictEnum(),
    /** Null: not rejected. */
    rejectReason: text({ enum: rejectReasons }),
    /** Null: the signature says nothing. */
    likelyCause: text({ enum: likelyCauses }),
    /** Null: there is a verdict. */
    noVerdictReason: text({ enum: noVerdictReasons }),
    faultCode: text(),
    faultDetail: text(),
    failingWhenStopped: boolean().notNull().default(false),
    /** False: the supply may still be on. Null: the run is open. */
    supplyOffConfirmed: boolean(),
    /** As read back. Null: not read. */
    supplyOffVolts: doublePrecision(),
    supplyOffBy: supplyOffWitnessEnum(),
    /** From scan to verdict on the station's clock. Null: open, or closed by recovery. */
    seconds: doublePrecision(),
    trimRounds: integer(),
    turnsAdvised: doublePrecision(),
    /** Every turn that was asked for. Null: open, or recorded before they were kept. */
    adjustments: jsonb().$type<Adjustment[]>(),
    /** What was scanned at the red bin. Null: no reject, or not scanned yet. */
    binCode: text(),
    binScannedAt: moment(),
    /** Null: the run is open. */
    closedBy: runCloserEnum(),
  },
  (t) => [
    uniqueIndex('runs_one_open_per_station')
      .on(t.stationId)
      .where(sql`${t.endedAt} is null`),
    uniqueIndex('runs_one_open_per_unit')
      .on(t.unitId)
      .where(sql`${t.endedAt} is null`),
    uniqueIndex('runs_attempt_of_unit').on(t.unitId, t.kind, t.attempt),
    index().on(t.lotId, t.startedAt),
    index().on(t.stationId, t.startedAt),
    index().on(t.startedAt),
    /** Few among many: the boards that wait for a decision are found by it. */
    index('runs_not_passed')
      .on(t.endedAt)
      .where(sql`${t.kind} = 'production' and ${t.verdict} in ('reject', 'no-verdict')`),
    check(
      'runs_of_something',
      sql`(${t.unitId} is null) = (${t.lotId} is null) and (${t.kind} <> 'production' or ${t.unitId} is not null)`,
    ),
    check(
      'runs_closed_whole',
      sql`(${t.endedAt} is null) = (${t.verdict} is null) and (${t.endedAt} is null) = (${t.closedBy} is null)`,
    ),
    check(
      'runs_reject_has_reason',
      sql`(${t.verdict} is not distinct from 'reject') = (${t.rejectReason} is not null)`,
    ),
    check(
      'runs_no_verdict_has_reason',
      sql`(${t.verdict} is not distinct from 'no-verdict') = (${t.noVerdictReason} is not null)`,
    ),
    check('runs_engineering_of_offer', sql`(${t.kind} = 'engineering') = (${t.offerId} is not null)`),
    check('runs_bin_scan_whole', sql`(${t.binCode} is null) = (${t.binScannedAt} is null)`),
  ],
);

export const runRelations = relations(runs, ({ one, many }) => ({
  unit: one(units, { fields: [runs.unitId], references: [units.id] }),
  lot: one(lots, { fields: [runs.lotId], references: [lots.id] }),
  station: one(stations, { fields: [runs.stationId], references: [stations.id] }),
  operator: one(accounts, { fields: [runs.operatorId], references: [accounts.id] }),
  referenceBoard: one(referenceBoards, { fields: [runs.referenceBoardId], references: [referenceBoards.id] }),
  measurements: many(measurements),
  traces: many(traces),
}));
