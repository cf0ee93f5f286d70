'use client';

import { VerdictMark } from '@/components/ui/verdict-mark';
import type { SerialRow } from '@/lib/contracts/lot-serials';
import { DataTable, deskColumns } from '../data-table';
import { count } from '../numbers';

const helper = deskColumns<SerialRow>();
const columns = helper.columns([
  helper.accessor('line', { header: 'Line', meta: { number: true } }),
  helper.accessor('serial', {
    header: 'Serial number',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => <span className="font-num">{getValue() || '–'}</span>,
  }),
  helper.accessor((row) => row.problem ?? '', {
    id: 'problem',
    header: 'Can it be stored?',
    sortFn: 'text',
    cell: ({ row }) =>
      row.original.problem === null ? (
        <span className="text-ink-2">yes</span>
      ) : (
        <span className="inline-flex items-start gap-1.5 font-bold text-reject">
          <VerdictMark shape="reject" size={14} />
          {row.original.problem}
        </span>
      ),
  }),
]);

/** Every row that would be stored, the bad ones first with their reason. */
export function SerialPreview({ rows }: { rows: readonly SerialRow[] }) {
  const bad = rows.filter((row) => row.problem !== null);
  const ordered = [...bad, ...rows.filter((row) => row.problem === null)];
  return (
    <div className="grid gap-2" aria-live="polite">
      <p className="text-lead">
        <b>{count(rows.length - bad.length)}</b> of <b>{count(rows.length)}</b> serial numbers can be stored
        {bad.length > 0 ? (
          <>
            , <b className="text-reject">{count(bad.length)}</b> cannot. Nothing is stored yet.
          </>
        ) : (
          '. Nothing is stored yet.'
        )}
      </p>
      <DataTable
        rows={ordered}
        columns={columns}
        rowKey={(row) => String(row.line)}
        label="Serial numbers to be stored"
        empty={{ title: 'No serial number was found.' }}
        pageSize={20}
      />
    </div>
  );
}
