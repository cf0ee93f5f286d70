import { listNewestLabels, listNewestRuns } from '@/db/queries/lots-boards';
import { listComponentBatches } from '@/db/queries/lots-components';
import { getLotSpan } from '@/db/queries/lots-runs';
import { findLotByCode } from '@/db/queries/lots';
import { listUnitRecordsOfLot } from '@/db/queries/unit-records';
import type { LotPage } from '@/lib/contracts/lot-page';
import { boardStanding } from '@/lib/decision/board-standing';
import { summariseLot } from '@/lib/statistics/lot-summary';
import { database } from '@/server/postgres';

/** A lot with all its boards, or null when there is none of that code. */
export async function readLotPage(code: string): Promise<LotPage | null> {
  const db = database();
  const lot = await findLotByCode(db, code.toUpperCase());
  if (!lot) return null;
  const [records, newest, labels, components, span] = await Promise.all([
    listUnitRecordsOfLot(db, lot.id),
    listNewestRuns(db, lot.id),
    listNewestLabels(db, lot.id),
    listComponentBatches(db, lot.id),
    getLotSpan(db, lot.id),
  ]);
  const newestOf = new Map(newest.map((run) => [run.unitId, run]));
  const labelOf = new Map(labels.map(({ unitId, ...label }) => [unitId, label]));
  return {
    id: lot.id,
    code: lot.code,
    state: lot.state,
    boardTypeCode: lot.boardTypeCode,
    boardTypeName: lot.boardTypeName,
    sequenceNumber: lot.sequenceNumber,
    createdAtIso: lot.createdAt.toISOString(),
    createdByName: lot.createdByName,
    closedAtIso: lot.closedAt?.toISOString() ?? null,
    hold:
      lot.heldAt === null
        ? null
        : { sinceIso: lot.heldAt.toISOString(), byName: lot.heldByName ?? '', reason: lot.holdReason ?? '' },
    stationCodes: span.stationCodes,
    firstTestIso: span.firstAt?.toISOString() ?? null,
    lastTestIso: span.lastAt?.toISOString() ?? null,
    summary: summariseLot(records),
    boards: records.map((record) => {
      const ended = newestOf.get(record.unitId);
      const decisive = record.runs.findLast((run) => run.verdict === 'pass' || run.verdict === 'reject');
      return {
        serial: record.serial,
        position: record.position,
        standing: boardStanding(record).kind,
        verdict: decisive?.verdict ?? (ended ? 'no-verdict' : null),
        rejectReason: decisive?.rejectReason ?? null,
        runs: record.runs.length,
        tripVolts: ended?.tripVolts ?? null,
        releaseVolts: ended?.releaseVolts ?? null,
        stationCode: ended?.stationCode ?? null,
        endedAtIso: ended?.endedAt.toISOString() ?? null,
        label: labelOf.get(record.unitId) ?? null,
      };
    }),
    components: components.map(({ fromAt, ...batch }) => ({ ...batch, fromIso: fromAt.toISOString() })),
  };
}
