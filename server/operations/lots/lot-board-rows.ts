import type { NewestRun } from '@/db/queries/lots-boards';
import type { UnitRecord } from '@/db/queries/unit-records';
import type { LotBoardRow } from '@/lib/contracts/lot-page';
import type { BoardChoice, BoardSort, LotView } from '@/lib/contracts/lot-view';
import { boardStanding } from '@/lib/decision/board-standing';

const decisiveRun = (record: UnitRecord) =>
  record.runs.findLast((run) => run.verdict === 'pass' || run.verdict === 'reject');
const hasEnded = (record: UnitRecord) => record.runs.some((run) => run.verdict !== null);

/** One row of the table of boards; `newest` and `label` may be left out where only the record is asked for. */
export function boardRow(
  record: UnitRecord,
  newest: NewestRun | undefined,
  label: LotBoardRow['label'] | undefined,
): LotBoardRow {
  const decisive = decisiveRun(record);
  return {
    serial: record.serial,
    position: record.position,
    standing: boardStanding(record).kind,
    verdict: decisive?.verdict ?? (hasEnded(record) ? 'no-verdict' : null),
    rejectReason: decisive?.rejectReason ?? null,
    runs: record.runs.length,
    tripVolts: newest?.tripVolts ?? null,
    releaseVolts: newest?.releaseVolts ?? null,
    stationCode: newest?.stationCode ?? null,
    endedAtIso: newest?.endedAt.toISOString() ?? null,
    label: label ?? null,
  };
}

const waits = new Set(['needs-disposition', 'waits-for-quality']);
const picks: Record<BoardChoice, (record: UnitRecord) => boolean> = {
  all: () => true,
  rejected: (record) => decisiveRun(record)?.verdict === 'reject',
  undecided: (record) => waits.has(boardStanding(record).kind),
  untested: (record) => !hasEnded(record),
};

export const isChosen = (record: UnitRecord, choice: BoardChoice): boolean => picks[choice](record);

export const sortsByNewestRun = (sort: BoardSort): boolean =>
  sort === 'trip' || sort === 'release' || sort === 'ended' || sort === 'label';

const keys: Record<BoardSort, (row: LotBoardRow) => string | number | null> = {
  position: (row) => row.position,
  serial: (row) => row.serial,
  verdict: (row) => row.rejectReason ?? row.verdict,
  trip: (row) => row.tripVolts?.value ?? null,
  release: (row) => row.releaseVolts?.value ?? null,
  runs: (row) => row.runs,
  label: (row) => row.label?.state ?? null,
  ended: (row) => row.endedAtIso,
};

/** In the order asked for; rows without such a value last, equal ones in lot order. */
export function sortRows<Row extends LotBoardRow>(
  rows: readonly Row[],
  { sort, order }: Pick<LotView, 'sort' | 'order'>,
): Row[] {
  const key = keys[sort];
  const turn = order === 'rising' ? 1 : -1;
  return [...rows].sort((a, b) => {
    const [x, y] = [key(a), key(b)];
    if (x === null || y === null) return x === y ? a.position - b.position : x === null ? 1 : -1;
    return (x < y ? -1 : x > y ? 1 : 0) * turn || a.position - b.position;
  });
}
