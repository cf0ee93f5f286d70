import { and, asc, desc, eq, gte, inArray, isNull, sql } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { accounts } from '@/db/schema/accounts';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { runs } from '@/db/schema/runs';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { sequences } from '@/db/schema/sequences';
import { stations } from '@/db/schema/stations';
import { units } from '@/db/schema/units';
import type { LotState } from '@/lib/contracts/stored-states';

type Reader = Database | Transaction;

export type Lot = typeof lots.$inferSelect;
export type NewLot = typeof lots.$inferInsert;

/** A released sequence with the newest approved specification of its board type: what a lot can be made from. */
export interface LotBasis {
  sequenceRevisionId: string;
  sequenceName: string;
  sequenceNumber: number;
  boardTypeRevisionId: string;
  boardTypeCode: string;
  boardTypeName: string;
  serialPattern: string;
}

export async function listLotBases(db: Reader): Promise<LotBasis[]> {
  const newestApproved = db
    .selectDistinctOn([boardTypeRevisions.boardTypeId])
    .from(boardTypeRevisions)
    .where(eq(boardTypeRevisions.status, 'approved'))
    .orderBy(boardTypeRevisions.boardTypeId, desc(boardTypeRevisions.number))
    .as('newest_approved');
  const rows = await db
    .select({
      sequenceRevisionId: sequenceRevisions.id,
      sequenceName: sequences.name,
      sequenceNumber: sequenceRevisions.number,
      boardTypeRevisionId: newestApproved.id,
      boardTypeCode: boardTypes.code,
      boardTypeName: boardTypes.name,
      specification: newestApproved.specification,
    })
    .from(sequenceRevisions)
    .innerJoin(sequences, eq(sequences.id, sequenceRevisions.sequenceId))
    .innerJoin(boardTypes, eq(boardTypes.id, sequences.boardTypeId))
    .innerJoin(newestApproved, eq(newestApproved.boardTypeId, boardTypes.id))
    .where(eq(sequenceRevisions.status, 'released'))
    .orderBy(asc(boardTypes.code), asc(sequences.name), desc(sequenceRevisions.number));
  return rows.map(({ specification, ...row }) => ({ ...row, serialPattern: specification.serialPattern }));
}

export async function insertLot(tx: Transaction, lot: NewLot, serials: readonly string[]): Promise<Lot> {
  const [row] = await tx.insert(lots).values(lot).returning();
  const boards = serials.map((serial, i) => ({ serial, lotId: row!.id, position: i + 1 }));
  for (let from = 0; from < boards.length; from += 1_000)
    await tx.insert(units).values(boards.slice(from, from + 1_000));
  return row!;
}

export async function updateLot(tx: Transaction, lotId: string, change: Partial<NewLot>): Promise<void> {
  await tx.update(lots).set(change).where(eq(lots.id, lotId));
}

/** The row, locked until the transaction ends. */
export async function findLotForUpdate(tx: Transaction, lotId: string): Promise<Lot | null> {
  const [row] = await tx.select().from(lots).where(eq(lots.id, lotId)).for('update');
  return row ?? null;
}

/** Which of these serials exist, with the code of their lot. */
export async function listLotsOfSerials(db: Reader, serials: readonly string[]): Promise<Map<string, string>> {
  const found = new Map<string, string>();
  for (let from = 0; from < serials.length; from += 1_000) {
    const rows = await db
      .select({ serial: units.serial, code: lots.code })
      .from(units)
      .innerJoin(lots, eq(lots.id, units.lotId))
      .where(inArray(units.serial, serials.slice(from, from + 1_000)));
    for (const row of rows) found.set(row.serial, row.code);
  }
  return found;
}

const lotColumns = {
  id: lots.id,
  code: lots.code,
  state: lots.state,
  size: lots.size,
  heldAt: lots.heldAt,
  holdReason: lots.holdReason,
  createdAt: lots.createdAt,
  closedAt: lots.closedAt,
  boardTypeCode: boardTypes.code,
  boardTypeName: boardTypes.name,
  sequenceNumber: sequenceRevisions.number,
};
export interface LotRow {
  id: string;
  code: string;
  state: LotState;
  size: number;
  heldAt: Date | null;
  holdReason: string | null;
  createdAt: Date;
  closedAt: Date | null;
  boardTypeCode: string;
  boardTypeName: string;
  sequenceNumber: number;
}

const lotRows = (db: Reader) =>
  db
    .select(lotColumns)
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lots.sequenceRevisionId))
    .$dynamic();

export interface LotFilter {
  state: LotState | 'held' | 'all';
  /** Null: all stations. */
  stationCode: string | null;
  /** Null: from the beginning. */
  since: Date | null;
}

/** Newest first. With a station, the lots of which it tested a board. */
export async function listLots(db: Reader, filter: LotFilter): Promise<LotRow[]> {
  const testedThere = db
    .select({ lotId: runs.lotId })
    .from(runs)
    .innerJoin(stations, eq(stations.id, runs.stationId))
    .where(and(eq(stations.code, filter.stationCode ?? ''), eq(runs.kind, 'production')));
  return lotRows(db)
    .where(
      and(
        filter.state === 'held'
          ? sql`${lots.heldAt} is not null`
          : filter.state === 'all'
            ? undefined
            : eq(lots.state, filter.state),
        filter.stationCode ? inArray(lots.id, testedThere) : undefined,
        filter.since ? gte(lots.createdAt, filter.since) : undefined,
      ),
    )
    .orderBy(desc(lots.createdAt));
}

export interface LotDetail extends LotRow {
  sequenceRevisionId: string;
  boardTypeRevisionId: string;
  createdByName: string;
  heldByName: string | null;
}

export async function findLotByCode(db: Reader, code: string): Promise<LotDetail | null> {
  const [row] = await lotRows(db).where(eq(lots.code, code));
  if (!row) return null;
  const [names] = await db
    .select({
      boardTypeRevisionId: lots.boardTypeRevisionId,
      sequenceRevisionId: lots.sequenceRevisionId,
      createdByName: accounts.name,
      heldBy: lots.heldBy,
    })
    .from(lots)
    .innerJoin(accounts, eq(accounts.id, lots.createdBy))
    .where(eq(lots.id, row.id));
  const holder = names!.heldBy
    ? await db.query.accounts.findFirst({ columns: { name: true }, where: eq(accounts.id, names!.heldBy) })
    : null;
  return {
    ...row,
    boardTypeRevisionId: names!.boardTypeRevisionId,
    sequenceRevisionId: names!.sequenceRevisionId,
    createdByName: names!.createdByName,
    heldByName: holder?.name ?? null,
  };
}

export interface LotCounts {
  tested: number;
  passedFirst: number;
  passedLast: number;
}

/** Counts of many lots at once, by first and last verdict. A lot without a verdict is left out. */
export async function countLots(db: Reader, lotIds: readonly string[]): Promise<Map<string, LotCounts>> {
  if (lotIds.length === 0) return new Map();
  const verdicts = db
    .select({
      lotId: runs.lotId,
      verdict: runs.verdict,
      isFirst: sql<boolean>`row_number() over (partition by ${runs.unitId} order by ${runs.attempt}) = 1`.as(
        'is_first',
      ),
      isLast: sql<boolean>`row_number() over (partition by ${runs.unitId} order by ${runs.attempt} desc) = 1`.as(
        'is_last',
      ),
    })
    .from(runs)
    .where(
      and(eq(runs.kind, 'production'), inArray(runs.verdict, ['pass', 'reject']), inArray(runs.lotId, [...lotIds])),
    )
    .as('verdicts');
  const count = (condition: ReturnType<typeof sql>) => sql<number>`count(*) filter (where ${condition})::int`;
  const rows = await db
    .select({
      lotId: verdicts.lotId,
      tested: count(sql`${verdicts.isFirst}`),
      passedFirst: count(sql`${verdicts.isFirst} and ${verdicts.verdict} = 'pass'`),
      passedLast: count(sql`${verdicts.isLast} and ${verdicts.verdict} = 'pass'`),
    })
    .from(verdicts)
    .groupBy(verdicts.lotId);
  return new Map(rows.map(({ lotId, ...counts }) => [lotId!, counts]));
}

export async function listStationCodes(db: Reader): Promise<{ code: string; name: string }[]> {
  return db
    .select({ code: stations.code, name: stations.name })
    .from(stations)
    .where(isNull(stations.retiredAt))
    .orderBy(asc(stations.code));
}
