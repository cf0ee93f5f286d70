import { countLots, listLotBases, listLots, listStationCodes, type LotBasis, type LotFilter } from '@/db/queries/lots';
import type { LotState } from '@/lib/contracts/stored-states';
import { database } from '@/server/postgres';

/** One row of the list of lots. Yields are shares of the tested boards, null before the first verdict. */
export interface LotListRow {
  code: string;
  state: LotState;
  held: boolean;
  boardTypeCode: string;
  boardTypeName: string;
  sequenceNumber: number;
  size: number;
  tested: number;
  rejected: number;
  firstPassYield: number | null;
  finalYield: number | null;
  createdAtIso: string;
}

export interface LotList {
  rows: LotListRow[];
  stations: { code: string; name: string }[];
  /** Empty while no sequence is released: then no lot can be made. */
  bases: LotBasis[];
}

export async function listLotsForDesk(filter: LotFilter): Promise<LotList> {
  const db = database();
  const [lots, stations, bases] = await Promise.all([listLots(db, filter), listStationCodes(db), listLotBases(db)]);
  const counts = await countLots(
    db,
    lots.map((lot) => lot.id),
  );
  return {
    stations,
    bases,
    rows: lots.map((lot) => {
      const { tested, passedFirst, passedLast } = counts.get(lot.id) ?? { tested: 0, passedFirst: 0, passedLast: 0 };
      return {
        code: lot.code,
        state: lot.state,
        held: lot.heldAt !== null,
        boardTypeCode: lot.boardTypeCode,
        boardTypeName: lot.boardTypeName,
        sequenceNumber: lot.sequenceNumber,
        size: lot.size,
        tested,
        rejected: tested - passedLast,
        firstPassYield: tested > 0 ? passedFirst / tested : null,
        finalYield: tested > 0 ? passedLast / tested : null,
        createdAtIso: lot.createdAt.toISOString(),
      };
    }),
  };
}

/** Released sequences that a lot can be made from. */
export function listBasesForLot(): Promise<LotBasis[]> {
  return listLotBases(database());
}
