import { and, asc, desc, eq, inArray, isNotNull, isNull, lt, lte, or, sql } from 'drizzle-orm';
import type { LabelLayout } from '@/lib/contracts/board-type';
import type { Database, Transaction } from '../client';
import { boardTypeRevisions } from '../schema/board-type-revisions';
import { boardTypes } from '../schema/board-types';
import { labels } from '../schema/labels';
import { lots } from '../schema/lots';
import { measurements } from '../schema/measurements';
import { printers } from '../schema/printers';
import { runs } from '../schema/runs';
import { units } from '../schema/units';

type Reader = Database | Transaction;

export interface NewLabel {
  unitId: string;
  runId: string;
  /** Null: the station has no printer, so the label waits. */
  printerId: string | null;
}

export async function insertLabel(tx: Transaction, label: NewLabel): Promise<{ id: string }> {
  const [row] = await tx.insert(labels).values(label).returning({ id: labels.id });
  return row!;
}

/**
 * Takes labels that are due and keeps every other sender off them until `leaseUntil`. At most `most`, oldest first; none
 * that failed `mostTries` times.
 */
export async function claimDueLabels(
  db: Database,
  { now, leaseUntil, most, mostTries }: { now: Date; leaseUntil: Date; most: number; mostTries: number },
): Promise<{ id: string }[]> {
  const due = db
    .select({ id: labels.id })
    .from(labels)
    .where(
      and(
        inArray(labels.state, ['waiting', 'failed']),
        isNotNull(labels.printerId),
        lt(labels.tries, mostTries),
        or(isNull(labels.nextTryAt), lte(labels.nextTryAt, now)),
      ),
    )
    .orderBy(asc(labels.createdAt))
    .limit(most)
    .for('update', { skipLocked: true });
  return db.update(labels).set({ nextTryAt: leaseUntil }).where(inArray(labels.id, due)).returning({ id: labels.id });
}

export interface LabelJob {
  id: string;
  tries: number;
  printerJobId: number | null;
  printerUri: string;
  serial: string;
  boardTypeCode: string;
  boardTypeName: string;
  /** As verified in the run that passed. Null: not measured. */
  tripVolts: number | null;
  releaseVolts: number | null;
  /** As the board type of the lot lays it out; absent: both lines. */
  lines?: LabelLayout;
}

/** Null when the label has been printed, or has no printer, since it was claimed. */
export async function findLabelJob(db: Reader, labelId: string): Promise<LabelJob | null> {
  const [row] = await db
    .select({
      id: labels.id,
      runId: labels.runId,
      tries: labels.tries,
      printerJobId: labels.printerJobId,
      printerUri: printers.uri,
      serial: units.serial,
      boardTypeCode: boardTypes.code,
      boardTypeName: boardTypes.name,
    })
    .from(labels)
    .innerJoin(printers, eq(printers.id, labels.printerId))
    .innerJoin(units, eq(units.id, labels.unitId))
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .where(and(eq(labels.id, labelId), inArray(labels.state, ['waiting', 'failed'])));
  if (!row) return null;
  const { runId, ...job } = row;
  return { ...job, ...(await labelledPoints(db, runId)) };
}

/** What a label states: the points verified last in the run, and which lines its board type wants. */
export async function labelledPoints(
  db: Reader,
  runId: string,
): Promise<Pick<LabelJob, 'tripVolts' | 'releaseVolts' | 'lines'>> {
  const [laidOut] = await db
    .select({ specification: boardTypeRevisions.specification })
    .from(runs)
    .innerJoin(units, eq(units.id, runs.unitId))
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(eq(runs.id, runId));
  const points = await db
    .select({ quantity: measurements.quantity, value: measurements.value })
    .from(measurements)
    .where(
      and(
        eq(measurements.runId, runId),
        eq(measurements.phase, 'verified'),
        inArray(measurements.quantity, ['trip-volts', 'release-volts']),
      ),
    )
    .orderBy(desc(measurements.n));
  const last = (quantity: string) => points.find((point) => point.quantity === quantity)?.value ?? null;
  return {
    tripVolts: last('trip-volts'),
    releaseVolts: last('release-volts'),
    lines: laidOut?.specification.label,
  };
}

export type LabelChange = Partial<
  Pick<
    typeof labels.$inferInsert,
    'state' | 'problem' | 'tries' | 'nextTryAt' | 'printerJobId' | 'printedAt' | 'printerId'
  >
>;

/** Ends the claim; a label that has been printed keeps its state. */
export async function updateLabel(db: Reader, labelId: string, change: LabelChange): Promise<void> {
  await db
    .update(labels)
    .set(change)
    .where(and(eq(labels.id, labelId), sql`${labels.state} <> 'printed'`));
}

export interface LabelRow {
  id: string;
  runId: string;
  state: (typeof labels.$inferSelect)['state'];
  problem: string | null;
  printerName: string | null;
  createdAt: Date;
  printedAt: Date | null;
}

/** All labels of a unit, newest first. */
export async function listLabelsOfUnit(db: Reader, unitId: string): Promise<LabelRow[]> {
  return db
    .select({
      id: labels.id,
      runId: labels.runId,
      state: labels.state,
      problem: labels.problem,
      printerName: printers.name,
      createdAt: labels.createdAt,
      printedAt: labels.printedAt,
    })
    .from(labels)
    .leftJoin(printers, eq(printers.id, labels.printerId))
    .where(eq(labels.unitId, unitId))
    .orderBy(desc(labels.createdAt));
}
