import { findSecondsEach } from '@/db/queries/runs-bench';
import { listUnitRecordsOfLot } from '@/db/queries/unit-records';
import type { Database } from '@/db/client';
import type { LotStrip } from '@/lib/contracts/bench-view';
import { summariseLot } from '@/lib/statistics/lot-summary';

/** The lot rule of a bench: one mark a board in lot order, and the counts beside it. */
export async function readLotStrip(
  db: Database,
  lot: { lotId: string; code: string; boardTypeCode: string },
): Promise<LotStrip> {
  const [records, secondsEach] = await Promise.all([
    listUnitRecordsOfLot(db, lot.lotId),
    findSecondsEach(db, lot.lotId),
  ]);
  const { size, marks, tested, rejected } = summariseLot(records);
  const { lotId, code, boardTypeCode } = lot;
  return { lotId, code, boardTypeCode, size, marks, tested, passed: tested - rejected, rejected, secondsEach };
}
