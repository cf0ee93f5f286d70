'use client';

import Link from 'next/link';
import { useMemo } from 'react';
import { MiniGauge } from '@/components/ui/mini-gauge';
import { SerialStrip } from '@/components/ui/serial-strip';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { LotBoardRow, PointAgainstLimits } from '@/lib/contracts/lot-page';
import { boardsPerPage, type LotView } from '@/lib/contracts/lot-view';
import { DataTable, deskColumns } from '../data-table';
import { volts } from '../numbers';
import { Time } from '../time';
import { labelWords, rejectWords, standingWords } from '../words';

const helper = deskColumns<LotBoardRow & { boardTypeCode: string }>();

function Point({ point, tone }: { point: PointAgainstLimits | null; tone: 'trip' | 'release' }) {
  if (!point) return <span className="text-ink-3">–</span>;
  const { value, min, max } = point;
  const outside = (min !== null && value < min) || (max !== null && value > max);
  const limits = min !== null && max !== null ? `, limits ${volts(min)} to ${volts(max)}` : '';
  return (
    <span className="inline-flex items-center justify-end gap-3">
      <MiniGauge value={value} min={min} max={max} tone={tone} label={`${volts(value)} V${limits}`} />
      <b className={outside ? 'text-reject' : ''}>{volts(value)} V</b>
    </span>
  );
}

const verdictText = ({ verdict, rejectReason }: LotBoardRow) =>
  verdict === 'reject' && rejectReason ? rejectWords[rejectReason] : verdict === 'pass' ? 'Passed' : 'No verdict';

function Verdict({ row }: { row: LotBoardRow }) {
  if (row.standing === 'in-test') return <b>In test</b>;
  if (row.verdict === null) return <span className="text-ink-3">not tested</span>;
  const waits = row.standing === 'waits-for-quality';
  return (
    <span className="inline-flex items-center gap-2">
      <VerdictMark shape={row.verdict === 'pass' ? 'pass' : row.verdict === 'reject' ? 'reject' : 'check'} size={16} />
      <span>
        {verdictText(row)}
        {waits || (row.verdict === 'reject' && row.standing !== 'needs-disposition') ? (
          <span className="text-ink-2">, {standingWords[row.standing].toLowerCase()}</span>
        ) : null}
      </span>
    </span>
  );
}

const columns = helper.columns([
  helper.accessor('position', { header: 'No.', meta: { number: true } }),
  helper.accessor('serial', {
    header: 'Serial',
    sortFn: 'alphanumeric',
    cell: ({ row }) => (
      <Link className="sw-link" href={`/units/${encodeURIComponent(row.original.serial)}`}>
        <SerialStrip serial={row.original.serial} boardTypeCode={row.original.boardTypeCode} />
      </Link>
    ),
  }),
  helper.accessor((row) => row.rejectReason ?? row.verdict ?? '', {
    id: 'verdict',
    header: 'Verdict',
    sortFn: 'text',
    cell: ({ row }) => <Verdict row={row.original} />,
  }),
  helper.accessor((row) => row.tripVolts?.value, {
    id: 'trip',
    header: 'Trip',
    sortUndefined: 'last',
    meta: { number: true },
    cell: ({ row }) => <Point point={row.original.tripVolts} tone="trip" />,
  }),
  helper.accessor((row) => row.releaseVolts?.value, {
    id: 'release',
    header: 'Release',
    sortUndefined: 'last',
    meta: { number: true },
    cell: ({ row }) => <Point point={row.original.releaseVolts} tone="release" />,
  }),
  helper.accessor('runs', { header: 'Runs', meta: { number: true } }),
  helper.accessor((row) => row.label?.state ?? '', {
    id: 'label',
    header: 'Label',
    sortFn: 'text',
    cell: ({ row: { original } }) =>
      original.label ? (
        <span className="inline-flex items-center gap-1.5" title={original.label.problem ?? undefined}>
          {original.label.state === 'failed' ? <VerdictMark shape="check" size={14} /> : null}
          {labelWords[original.label.state]}
        </span>
      ) : null,
  }),
  helper.accessor((row) => row.endedAtIso ?? undefined, {
    id: 'ended',
    header: 'Last tested',
    sortFn: 'text',
    sortUndefined: 'last',
    cell: ({ row: { original } }) =>
      original.endedAtIso ? (
        <span>
          <Time iso={original.endedAtIso} />, {original.stationCode}
        </span>
      ) : null,
  }),
]);

interface LotBoardsTableProps {
  /** One page of them, sorted. */
  boards: readonly LotBoardRow[];
  /** On all pages. */
  chosen: number;
  boardTypeCode: string;
  view: LotView;
  changeView: (change: Partial<LotView>) => void;
}

/** Boards of the lot; order and page are the server's and stand in the address. */
export function LotBoardsTable({ boards, chosen, boardTypeCode, view, changeView }: LotBoardsTableProps) {
  const rows = useMemo(() => boards.map((row) => ({ ...row, boardTypeCode })), [boards, boardTypeCode]);
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.serial}
      label="Boards of the lot"
      empty={{ title: 'No board is shown.', text: 'Choose other boards above.' }}
      pageSize={boardsPerPage}
      served={{
        sorting: [{ id: view.sort, desc: view.order === 'falling' }],
        pageIndex: view.page - 1,
        rowCount: chosen,
        onSort: ({ id, desc }) =>
          changeView({ sort: id as LotView['sort'], order: desc ? 'falling' : 'rising', page: 1 }),
        onPage: (pageIndex) => changeView({ page: pageIndex + 1 }),
      }}
    />
  );
}
