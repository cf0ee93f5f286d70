import { and, asc, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { dispositions } from '@/db/schema/dispositions';
import { lots } from '@/db/schema/lots';
import { retestOrders } from '@/db/schema/retest-orders';
import { runs } from '@/db/schema/runs';
import { units } from '@/db/schema/units';
import type { LotBoard } from '@/lib/statistics/lot-summary';

export interface UnitRecord extends LotBoard {
  unitId: string;
  position: number;
}

/** The record of every unit in the lot, in lot order. */
export function listUnitRecordsOfLot(db: Database | Transaction, lotId: string): Promise<UnitRecord[]> {
  return listRecords(db, eq(units.lotId, lotId));
}

/** The records of these units, in no order that matters. */
export function listUnitRecordsById(db: Database | Transaction, unitIds: readonly string[]): Promise<UnitRecord[]> {
  return unitIds.length === 0 ? Promise.resolve([]) : listRecords(db, inArray(units.id, [...unitIds]));
}

/** What is on record of one board; null when there is no such unit. */
export async function findUnitRecord(db: Database | Transaction, unitId: string): Promise<UnitRecord | null> {
  const [record] = await listRecords(db, eq(units.id, unitId));
  return record ?? null;
}

async function listRecords(db: Database | Transaction, which: SQL): Promise<UnitRecord[]> {
  const boards = await db
    .select({
      unitId: units.id,
      serial: units.serial,
      position: units.position,
      scrappedAt: units.scrappedAt,
      mostAttempts: sql<number>`(${boardTypeRevisions.specification} ->> 'mostAttempts')::int`,
    })
    .from(units)
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(which)
    .orderBy(asc(units.position));
  const ids = db.select({ id: units.id }).from(units).where(which);
  const [made, decided, ordered] = await Promise.all([
    db
      .select({
        unitId: runs.unitId,
        id: runs.id,
        endedAt: runs.endedAt,
        verdict: runs.verdict,
        failingWhenStopped: runs.failingWhenStopped,
        rejectReason: runs.rejectReason,
      })
      .from(runs)
      .where(and(inArray(runs.unitId, ids), eq(runs.kind, 'production')))
      .orderBy(asc(runs.attempt)),
    db
      .select({
        unitId: dispositions.unitId,
        runId: dispositions.runId,
        kind: dispositions.kind,
        signedAt: dispositions.signedAt,
        secondSignedAt: dispositions.secondSignedAt,
      })
      .from(dispositions)
      .where(inArray(dispositions.unitId, ids)),
    db
      .select({ unitId: retestOrders.unitId, id: retestOrders.id, usedByRunId: retestOrders.usedByRunId })
      .from(retestOrders)
      .where(inArray(retestOrders.unitId, ids))
      .orderBy(asc(retestOrders.signedAt)),
  ]);
  const runsOf = byUnit(made);
  const dispositionsOf = byUnit(decided);
  const ordersOf = byUnit(ordered);
  return boards.map(({ scrappedAt, ...board }) => ({
    ...board,
    scrapped: scrappedAt !== null,
    runs: (runsOf.get(board.unitId) ?? []).map((run) => ({ ...run, endedAt: run.endedAt?.toISOString() ?? null })),
    dispositions: (dispositionsOf.get(board.unitId) ?? []).map((disposition) => ({
      runId: disposition.runId,
      kind: disposition.kind,
      signedAt: disposition.signedAt.toISOString(),
      complete: disposition.kind !== 'concession' || disposition.secondSignedAt !== null,
    })),
    retestOrders: ordersOf.get(board.unitId) ?? [],
  }));
}

function byUnit<Row extends { unitId: string | null }>(rows: Row[]): Map<string | null, Row[]> {
  const groups = new Map<string | null, Row[]>();
  for (const row of rows) {
    const group = groups.get(row.unitId);
    if (group) group.push(row);
    else groups.set(row.unitId, [row]);
  }
  return groups;
}
