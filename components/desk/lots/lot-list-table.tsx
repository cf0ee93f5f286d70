'use client';

import Link from 'next/link';
import type { LotState } from '@/lib/contracts/stored-states';
import { DataTable, deskColumns } from '../data-table';
import { count, percent } from '../numbers';
import { Time } from '../time';
import { LotStateMark } from './lot-state';

export interface LotTableRow {
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

const helper = deskColumns<LotTableRow>();
const columns = helper.columns([
  helper.accessor('code', {
    header: 'Lot',
    sortFn: 'alphanumeric',
    cell: ({ row }) => (
      <Link className="sw-link font-num font-bold" href={`/lots/${encodeURIComponent(row.original.code)}`}>
        {row.original.code}
      </Link>
    ),
  }),
  helper.accessor((row) => (row.held ? 'held' : row.state), {
    id: 'state',
    header: 'State',
    sortFn: 'text',
    cell: ({ row }) => <LotStateMark state={row.original.state} held={row.original.held} />,
  }),
  helper.accessor('boardTypeCode', {
    header: 'Board type',
    sortFn: 'text',
    cell: ({ row }) => (
      <span title={row.original.boardTypeName}>
        <span className="font-num">{row.original.boardTypeCode}</span> r{row.original.sequenceNumber}
      </span>
    ),
  }),
  helper.accessor('tested', {
    header: 'Tested',
    meta: { number: true },
    cell: ({ row }) => (
      <span>
        <b>{count(row.original.tested)}</b> of {count(row.original.size)}
      </span>
    ),
  }),
  helper.accessor('rejected', {
    header: 'Rejected',
    meta: { number: true },
    cell: ({ getValue }) => (getValue() > 0 ? <b className="text-reject">{count(getValue())}</b> : '0'),
  }),
  helper.accessor('firstPassYield', {
    header: 'First pass',
    meta: { number: true },
    cell: ({ getValue }) => percent(getValue()),
  }),
  helper.accessor('finalYield', {
    header: 'Final',
    meta: { number: true },
    cell: ({ getValue }) => percent(getValue()),
  }),
  helper.accessor('createdAtIso', {
    header: 'Made',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={getValue()} format="day" />,
  }),
]);

export function LotListTable({ rows, nothing }: { rows: LotTableRow[]; nothing: { title: string; text?: string } }) {
  return <DataTable rows={rows} columns={columns} rowKey={(row) => row.code} label="Lots" empty={nothing} />;
}
