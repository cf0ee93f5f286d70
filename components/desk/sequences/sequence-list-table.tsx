'use client';

import Link from 'next/link';
import { VerdictMark } from '@/components/ui/verdict-mark';
import type { SequenceListRow } from '@/lib/contracts/sequence-pages';
import { DataTable, deskColumns } from '../data-table';
import { count } from '../numbers';
import { Time } from '../time';

const helper = deskColumns<SequenceListRow>();

const columns = helper.columns([
  helper.accessor('name', {
    header: 'Sequence',
    sortFn: 'alphanumeric',
    cell: ({ row }) => (
      <Link className="sw-link font-bold" href={`/sequences/${row.original.id}`}>
        {row.original.name}
      </Link>
    ),
  }),
  helper.accessor('boardTypeCode', {
    header: 'Board type',
    sortFn: 'text',
    cell: ({ row }) => (
      <span className="font-num" title={row.original.boardTypeName}>
        {row.original.boardTypeCode}
      </span>
    ),
  }),
  helper.accessor((row) => row.inUse?.atIso ?? '', {
    id: 'in-use',
    header: 'In use',
    sortFn: 'text',
    cell: ({ row }) => <InUse row={row.original} />,
  }),
  helper.accessor((row) => (row.draft ? `${row.draft.state === 'submitted' ? 0 : 1}${row.draft.atIso}` : '2'), {
    id: 'work',
    header: 'In work',
    sortFn: 'text',
    cell: ({ row }) => <InWork row={row.original} />,
  }),
  helper.accessor('openLots', {
    header: 'Open lots',
    sortFn: 'alphanumeric',
    meta: { number: true },
    cell: ({ row }) => <OpenLots row={row.original} />,
  }),
]);

function InUse({ row: { inUse } }: { row: SequenceListRow }) {
  if (!inUse) return <span className="text-ink-2">none released</span>;
  return (
    <span>
      <b>r{inUse.number}</b>, {inUse.by}, <Time iso={inUse.atIso} format="day" />
    </span>
  );
}

function InWork({ row: { id, draft } }: { row: SequenceListRow }) {
  if (!draft) return <span className="text-ink-3">–</span>;
  const waits = draft.state === 'submitted';
  return (
    <span className="inline-flex items-center gap-1.5">
      {waits || draft.sentBack ? <VerdictMark shape="check" size={15} /> : null}
      <span>
        <Link className="sw-link" href={waits ? `/sequences/${id}/compare` : `/sequences/${id}/draft`}>
          r{draft.number}
        </Link>
        {waits ? ' waits for release, ' : draft.sentBack ? ' draft, sent back, ' : ' draft, '}
        {draft.by}, <Time iso={draft.atIso} format="day" />
      </span>
    </span>
  );
}

function OpenLots({ row: { openLots, openLotsOlder } }: { row: SequenceListRow }) {
  if (openLots === 0) return <span className="text-ink-3">–</span>;
  return (
    <>
      {count(openLots)}
      {openLotsOlder > 0 ? <span className="font-text text-ink-2"> ({count(openLotsOlder)} older)</span> : null}
    </>
  );
}

export function SequenceListTable({ rows }: { rows: readonly SequenceListRow[] }) {
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.id}
      label="Sequences"
      empty={{ title: 'No sequence is shown.', text: 'Choose another state, board type or name above.' }}
    />
  );
}
