'use client';

import Link from 'next/link';
import { SerialStrip } from '@/components/ui/serial-strip';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { RejectReason, Verdict } from '@/lib/run/types';
import { DataTable, deskColumns } from '../data-table';
import { Time } from '../time';
import { rejectWords, verdictWords } from '../words';

interface UnitTableRow {
  serial: string;
  boardTypeCode: string;
  lotCode: string;
  verdict: Verdict;
  rejectReason: RejectReason | null;
  attempt: number;
  stationCode: string;
  endedAtIso: string;
}

const shapes = { pass: 'pass', reject: 'reject', 'no-verdict': 'check' } as const;
const helper = deskColumns<UnitTableRow>();
const columns = helper.columns([
  helper.accessor('serial', {
    header: 'Serial',
    sortFn: 'alphanumeric',
    cell: ({ row: { original } }) => (
      <Link className="sw-link" href={`/units/${encodeURIComponent(original.serial)}`}>
        <SerialStrip serial={original.serial} boardTypeCode={original.boardTypeCode} />
      </Link>
    ),
  }),
  helper.accessor('lotCode', {
    header: 'Lot',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => (
      <Link className="sw-link font-num" href={`/lots/${encodeURIComponent(getValue())}`}>
        {getValue()}
      </Link>
    ),
  }),
  helper.accessor((row) => row.rejectReason ?? row.verdict, {
    id: 'verdict',
    header: 'Verdict',
    sortFn: 'text',
    cell: ({ row: { original } }) => (
      <span className="inline-flex items-center gap-2">
        <VerdictMark shape={shapes[original.verdict]} size={16} />
        {original.rejectReason ? rejectWords[original.rejectReason] : verdictWords[original.verdict]}
      </span>
    ),
  }),
  helper.accessor('attempt', { header: 'Attempt', meta: { number: true } }),
  helper.accessor('stationCode', { header: 'Station', sortFn: 'alphanumeric' }),
  helper.accessor('endedAtIso', {
    header: 'Tested',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={getValue()} />,
  }),
]);

export function UnitListTable({ rows, nothing }: { rows: UnitTableRow[]; nothing: { title: string; text?: string } }) {
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => `${row.serial} ${row.attempt}`}
      label="Boards"
      empty={nothing}
    />
  );
}
