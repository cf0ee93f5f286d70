import { eq, type SQL } from 'drizzle-orm';
import type { Database, Transaction } from '@/db/client';
import { boardTypeRevisions } from '@/db/schema/board-type-revisions';
import { boardTypes } from '@/db/schema/board-types';
import { lots } from '@/db/schema/lots';
import { sequenceRevisions } from '@/db/schema/sequence-revisions';
import { units } from '@/db/schema/units';

type Reader = Database | Transaction;

const columns = {
  lotId: lots.id,
  code: lots.code,
  size: lots.size,
  state: lots.state,
  heldAt: lots.heldAt,
  boardTypeId: boardTypes.id,
  boardTypeCode: boardTypes.code,
  boardType: boardTypeRevisions.specification,
  boardTypeStatus: boardTypeRevisions.status,
  sequenceRevisionId: sequenceRevisions.id,
  sequence: sequenceRevisions.data,
  sequenceNumber: sequenceRevisions.number,
  sequenceStatus: sequenceRevisions.status,
  withdrawnReason: sequenceRevisions.withdrawnReason,
};

export type BenchLot = NonNullable<Awaited<ReturnType<typeof findBenchLot>>>;

/** A lot with all that its boards are tested by. */
export async function findBenchLot(db: Reader, by: { code: string } | { lotId: string }) {
  return findLot(db, 'code' in by ? eq(lots.code, by.code) : eq(lots.id, by.lotId));
}

async function findLot(db: Reader, which: SQL) {
  const [row] = await db
    .select(columns)
    .from(lots)
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .innerJoin(boardTypes, eq(boardTypes.id, boardTypeRevisions.boardTypeId))
    .innerJoin(sequenceRevisions, eq(sequenceRevisions.id, lots.sequenceRevisionId))
    .where(which);
  return row ?? null;
}

/** The board with this serial and the lot that it belongs to. */
export async function findUnitBySerial(db: Reader, serial: string) {
  const [row] = await db
    .select({
      unitId: units.id,
      lotId: units.lotId,
      lotCode: lots.code,
      boardTypeId: boardTypeRevisions.boardTypeId,
    })
    .from(units)
    .innerJoin(lots, eq(lots.id, units.lotId))
    .innerJoin(boardTypeRevisions, eq(boardTypeRevisions.id, lots.boardTypeRevisionId))
    .where(eq(units.serial, serial));
  return row ?? null;
}
