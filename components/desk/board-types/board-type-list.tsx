'use client';

import Link from 'next/link';
import { PointMark } from '@/components/ui/point-mark';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { BoardLimits } from '@/lib/contracts/board-type';
import { DataTable, deskColumns } from '../data-table';
import { limitsText } from '../numbers';

export interface BoardTypeListItem {
  code: string;
  name: string;
  limits: BoardLimits;
  /** Null: none is approved yet. */
  inUse: number | null;
  draft: { number: number; state: 'draft' | 'submitted'; madeBy: string } | null;
  lots: { all: number; open: number };
}

const volts = ({ min, max }: { min: number; max: number }) => limitsText('trip-volts', min, max);
const helper = deskColumns<BoardTypeListItem>();
const columns = helper.columns([
  helper.accessor('code', {
    header: 'Board type',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => (
      <Link className="sw-link font-num font-bold" href={`/board-types/${encodeURIComponent(getValue())}`}>
        {getValue()}
      </Link>
    ),
  }),
  helper.accessor('name', { header: 'Name', sortFn: 'text' }),
  helper.accessor((row) => row.limits.tripVolts.min, {
    id: 'trip',
    header: 'Trip, V',
    cell: ({ row }) => (
      <span className="font-num whitespace-nowrap">
        <PointMark point="trip" /> {volts(row.original.limits.tripVolts)}
      </span>
    ),
  }),
  helper.accessor((row) => row.limits.releaseVolts.min, {
    id: 'release',
    header: 'Release, V',
    cell: ({ row }) => (
      <span className="font-num whitespace-nowrap">
        <PointMark point="release" /> {volts(row.original.limits.releaseVolts)}
      </span>
    ),
  }),
  helper.accessor((row) => row.inUse ?? 0, {
    id: 'in-use',
    header: 'In use',
    meta: { number: true },
    cell: ({ row: { original } }) => original.inUse ?? <span className="font-text text-ink-2">none</span>,
  }),
  helper.accessor((row) => row.draft?.state ?? '', {
    id: 'draft',
    header: 'Draft',
    sortFn: 'text',
    cell: ({ row: { original } }) => <DraftState draft={original.draft} />,
  }),
  helper.accessor((row) => row.lots.all, {
    id: 'lots',
    header: 'Lots',
    meta: { number: true },
    cell: ({ row: { original } }) =>
      original.lots.open > 0 ? `${original.lots.all}, ${original.lots.open} open` : original.lots.all,
  }),
]);

function DraftState({ draft }: { draft: BoardTypeListItem['draft'] }) {
  if (!draft) return <span className="text-ink-2">none</span>;
  if (draft.state === 'draft') return `${draft.number} by ${draft.madeBy}`;
  return (
    <span>
      <VerdictMark shape="check" size={15} /> <b>{draft.number}</b> waits for quality
    </span>
  );
}

export function BoardTypeList({ rows }: { rows: BoardTypeListItem[] }) {
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.code}
      label="Board types"
      empty={{ title: 'No board type is kept here.' }}
    />
  );
}
