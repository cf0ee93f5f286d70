import { and, asc, desc, eq, ilike, inArray, isNotNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { dispositions } from '@/db/schema/dispositions';
import { lots } from '@/db/schema/lots';
import { measurements } from '@/db/schema/measurements';
import { retestOrders } from '@/db/schema/retest-orders';
import { runs } from '@/db/schema/runs';
import { signatures } from '@/db/schema/signatures';
import { stations } from '@/db/schema/stations';
import { traces } from '@/db/schema/traces';
import { units } from '@/db/schema/units';

type Reader = Database | Transaction;

export async function findUnit(db: Reader, serial: string) {
  const [row] = await db
    .select({
      id: units.id,
      serial: units.serial,
      position: units.position,
      lotId: units.lotId,
      lotCode: lots.code,
      lotHeldAt: lots.heldAt,
      boardTypeCode: boardTypes.code,
      boardTypeName: boardTypes.name,
    })
    .from(units)
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .where(eq(units.serial, serial));
  return row ?? null;
}

const madeRuns = (db: Reader) =>
  db
    .select({
      run: runs,
      stationCode: stations.code,
      fixture: stations.fixture,
      operatorNumber: accounts.operatorNumber,
      operatorName: accounts.name,
    })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .innerJoin(accounts, eq(accounts.id, runs.operatorId))
    .$dynamic();

/** Every run of the unit, engineering runs among them, with where and by whom, newest first. */
export function listRunsOfUnit(db: Reader, unitId: string) {
  return madeRuns(db).where(eq(runs.unitId, unitId)).orderBy(desc(runs.startedAt));
}

export async function findEngineeringRun(db: Reader, runId: string) {
  const [row] = await madeRuns(db).where(and(eq(runs.id, runId), eq(runs.kind, 'engineering')));
  return row ?? null;
}

export function listMeasurements(db: Reader, runIds: string[]) {
  if (runIds.length === 0) return Promise.resolve([]);
  return db.select().from(measurements).where(inArray(measurements.runId, runIds)).orderBy(asc(measurements.n));
}

export function listTraces(db: Reader, runIds: string[]) {
  if (runIds.length === 0) return Promise.resolve([]);
  return db.select().from(traces).where(inArray(traces.runId, runIds)).orderBy(asc(traces.n));
}

/** What was decided about the unit, newest first, with its signatures in the order they were given. */
export async function listDispositionsOfUnit(db: Reader, unitId: string) {
  const rows = await db.query.dispositions.findMany({
    where: eq(dispositions.unitId, unitId),
    orderBy: desc(dispositions.signedAt),
    with: { signer: { columns: { name: true } } },
  });
  const ids = rows.map((row) => row.id);
  const signed =
    ids.length === 0
      ? []
      : await db
          .select()
          .from(signatures)
          .where(and(eq(signatures.subject, 'disposition'), inArray(signatures.subjectId, ids)))
          .orderBy(asc(signatures.signedAt));
  return rows.map(({ signer, ...row }) => ({
    ...row,
    signedByName: signer.name,
    signatures: signed.filter(({ subjectId }) => subjectId === row.id),
  }));
}

export function listRetestOrdersOfUnit(db: Reader, unitId: string) {
  return db
    .select({
      id: retestOrders.id,
      reason: retestOrders.reason,
      signedAt: retestOrders.signedAt,
      usedByRunId: retestOrders.usedByRunId,
      signedByName: accounts.name,
    })
    .from(retestOrders)
    .innerJoin(accounts, eq(accounts.id, retestOrders.signedBy))
    .where(eq(retestOrders.unitId, unitId))
    .orderBy(desc(retestOrders.signedAt));
}

export interface FoundUnit {
  serial: string;
  lotCode: string;
  boardTypeCode: string;
}

/** Serials that contain the text, those that end with it first. At most `most`. */
export function searchUnits(db: Reader, text: string, most: number): Promise<FoundUnit[]> {
  const escaped = text.replace(/[\\%_]/g, (mark) => `\\${mark}`);
  return db
    .select({ serial: units.serial, lotCode: lots.code, boardTypeCode: boardTypes.code })
    .from(units)
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .where(ilike(units.serial, `%${escaped}%`))
    .orderBy(sql`${units.serial} ilike ${`%${escaped}`} desc`, asc(units.serial))
    .limit(most);
}

export interface FoundLot {
  code: string;
  boardTypeCode: string;
  size: number;
  state: (typeof lots.$inferSelect)['state'];
}

export function searchLots(db: Reader, text: string, most: number): Promise<FoundLot[]> {
  const escaped = text.replace(/[\\%_]/g, (mark) => `\\${mark}`);
  return db
    .select({ code: lots.code, boardTypeCode: boardTypes.code, size: lots.size, state: lots.state })
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .where(ilike(lots.code, `%${escaped}%`))
    .orderBy(desc(lots.createdAt))
    .limit(most);
}

export interface RecentRun {
  serial: string;
  boardTypeCode: string;
  lotCode: string;
  attempt: number;
  verdict: NonNullable<(typeof runs.$inferSelect)['verdict']>;
  rejectReason: (typeof runs.$inferSelect)['rejectReason'];
  endedAt: Date;
  stationCode: string;
}

/** Production runs that ended, newest first; `verdict` and `stationCode` null: any. */
export async function listRecentRuns(
  db: Reader,
  filter: {
    verdict: RecentRun['verdict'] | null;
    stationCode: string | null;
    most: number;
  },
): Promise<RecentRun[]> {
  const rows = await db
    .select({
      serial: units.serial,
      boardTypeCode: boardTypes.code,
      lotCode: lots.code,
      attempt: runs.attempt,
      verdict: runs.verdict,
      rejectReason: runs.rejectReason,
      endedAt: runs.endedAt,
      stationCode: stations.code,
    })
    .from(runs)
    .innerJoin(units, eq(units.id, runs.unitId))
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(
      and(
        eq(runs.kind, 'production'),
        isNotNull(runs.endedAt),
        filter.verdict ? eq(runs.verdict, filter.verdict) : undefined,
        filter.stationCode ? eq(stations.code, filter.stationCode) : undefined,
      ),
    )
    .orderBy(desc(runs.startedAt))
    .limit(filter.most);
  return rows.map((row) => ({ ...row, verdict: row.verdict!, endedAt: row.endedAt! }));
}
