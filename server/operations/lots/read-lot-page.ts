import { listNewestLabels, listNewestRuns } from '@/db/queries/lots-boards';
import { listComponentBatches } from '@/db/queries/lots-components';
import { getLotSpan } from '@/db/queries/lots-runs';
import { findLotByCode } from '@/db/queries/lots';
import { listUnitRecordsOfLot } from '@/db/queries/unit-records';
import type { LotPage } from '@/lib/contracts/lot-page';
import { boardsPerPage, lotViewSchema, type LotView } from '@/lib/contracts/lot-view';
import { summariseLot } from '@/lib/statistics/lot-summary';
import { database } from '@/server/postgres';
import { suspectBoards } from '../holds/suspect-boards';
import { readLotRevision } from './read-lot-revision';
import { boardRow, isChosen, sortsByNewestRun, sortRows } from './lot-board-rows';

type BoardsView = Pick<LotView, 'boards' | 'sort' | 'order' | 'page'>;

/** A lot with one page of its boards, or null when there is none of that code. */
export async function readLotPage(code: string, view: BoardsView = lotViewSchema.parse({})): Promise<LotPage | null> {
  const db = database();
  const lot = await findLotByCode(db, code.toUpperCase());
  if (!lot) return null;
  const [records, components, span, revision, suspects] = await Promise.all([
    listUnitRecordsOfLot(db, lot.id),
    listComponentBatches(db, lot.id),
    getLotSpan(db, lot.id),
    readLotRevision(lot.id, lot.sequenceRevisionId),
    lot.heldAt ? suspectBoards(db, lot.id) : null,
  ]);
  const chosen = records.filter((record) => isChosen(record, view.boards));
  const rowsOf = async (shown: typeof records) => {
    const unitIds = shown.length < records.length ? shown.map((record) => record.unitId) : undefined;
    const [newest, labels] = await Promise.all([
      listNewestRuns(db, lot.id, unitIds),
      listNewestLabels(db, lot.id, unitIds),
    ]);
    const newestOf = new Map(newest.map((run) => [run.unitId, run]));
    const labelOf = new Map(labels.map(({ unitId, ...label }) => [unitId, label]));
    return shown.map((record) => boardRow(record, newestOf.get(record.unitId), labelOf.get(record.unitId)));
  };
  const start = (Math.min(view.page, Math.max(1, Math.ceil(chosen.length / boardsPerPage))) - 1) * boardsPerPage;
  const onPage = <Row>(rows: Row[]) => rows.slice(start, start + boardsPerPage);
  // Only an order that follows from runs or labels needs those of every board.
  const boards = sortsByNewestRun(view.sort)
    ? onPage(sortRows(await rowsOf(chosen), view))
    : sortRows(await rowsOf(onPage(sortRecords(chosen, view))), view);
  return {
    id: lot.id,
    code: lot.code,
    state: lot.state,
    boardTypeCode: lot.boardTypeCode,
    boardTypeName: lot.boardTypeName,
    sequenceNumber: lot.sequenceNumber,
    revision,
    createdAtIso: lot.createdAt.toISOString(),
    createdByName: lot.createdByName,
    closedAtIso: lot.closedAt?.toISOString() ?? null,
    hold:
      lot.heldAt === null
        ? null
        : {
            sinceIso: lot.heldAt.toISOString(),
            byName: lot.heldByName,
            reason: lot.holdReason ?? '',
            suspects: { boards: suspects?.boards.length ?? 0, since: suspects?.since ?? 'good-check' },
          },
    stationCodes: span.stationCodes,
    firstTestIso: span.firstAt?.toISOString() ?? null,
    lastTestIso: span.lastAt?.toISOString() ?? null,
    firstSerial: records[0]?.serial ?? null,
    lastSerial: records.at(-1)?.serial ?? null,
    summary: summariseLot(records),
    boards,
    boardsChosen: chosen.length,
    components: components.map(({ fromAt, ...batch }) => ({ ...batch, fromIso: fromAt.toISOString() })),
  };
}

function sortRecords(records: Awaited<ReturnType<typeof listUnitRecordsOfLot>>, view: BoardsView) {
  const rows = records.map((record) => ({ record, ...boardRow(record, undefined, undefined) }));
  return sortRows(rows, view).map(({ record }) => record);
}
