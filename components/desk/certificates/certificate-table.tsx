'use client';

import Link from 'next/link';
import { SerialStrip } from '@/components/ui/serial-strip';
import type { CertificateRow } from '@/lib/contracts/certificate';
import { DataTable, deskColumns } from '../data-table';
import { Time } from '../time';
import { ValidityMark } from './validity-mark';

const helper = deskColumns<CertificateRow>();
const columns = helper.columns([
  helper.accessor('number', {
    header: 'Certificate',
    sortFn: 'alphanumeric',
    cell: ({ row: { original } }) => (
      <a className="sw-link font-num whitespace-nowrap" href={`/api/certificates/${original.id}/pdf`}>
        {original.number}
      </a>
    ),
  }),
  helper.accessor((row) => row.serial ?? '', {
    id: 'serial',
    header: 'Of',
    sortFn: 'alphanumeric',
    cell: ({ row: { original } }) =>
      original.serial ? (
        <Link className="sw-link" href={`/units/${encodeURIComponent(original.serial)}`}>
          <SerialStrip serial={original.serial} boardTypeCode={original.boardTypeCode} />
        </Link>
      ) : (
        'the whole lot'
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
  helper.accessor((row) => row.validity.kind, {
    id: 'validity',
    header: 'Now',
    sortFn: 'text',
    cell: ({ row: { original } }) => <ValidityMark validity={original.validity} />,
  }),
  helper.accessor('issuedByName', { header: 'Issued by', sortFn: 'text' }),
  helper.accessor('issuedIso', {
    header: 'Issued',
    sortFn: 'text',
    cell: ({ getValue }) => <Time iso={getValue()} />,
  }),
]);

export function CertificateTable({ rows, find }: { rows: CertificateRow[]; find: string | null }) {
  const empty = find
    ? { title: `No certificate has “${find}” in its number, serial number or lot.` }
    : { title: 'No certificate was issued yet.', text: 'Issue one on the page of a board that passed, or of a lot.' };
  return <DataTable rows={rows} columns={columns} rowKey={({ id }) => id} label="Certificates" empty={empty} />;
}
