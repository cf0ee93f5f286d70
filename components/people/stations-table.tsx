'use client';

import Link from 'next/link';
import { DataTable, deskColumns } from '@/components/desk/data-table';
import { count } from '@/components/desk/numbers';
import { Time } from '@/components/desk/time';

export interface StationTableRow {
  code: string;
  name: string;
  fixture: string;
  link: string;
  hasController: boolean;
  hasWiperProbe: boolean;
  printer: string | null;
  enrolledBrowsers: number;
  retiredIso: string | null;
}

const helper = deskColumns<StationTableRow>();
const columns = helper.columns([
  helper.accessor('code', {
    header: 'Station',
    sortFn: 'alphanumeric',
    cell: ({ row }) => (
      <Link className="sw-link font-num font-bold" href={`/administration/stations/${row.original.code}`}>
        {row.original.code}
      </Link>
    ),
  }),
  helper.accessor('name', { header: 'Name', sortFn: 'alphanumeric' }),
  helper.accessor('fixture', { header: 'Fixture', sortFn: 'alphanumeric' }),
  helper.accessor('link', { header: 'Instruments', sortFn: 'text' }),
  helper.accessor((row) => (row.hasController ? 'yes' : 'no'), {
    id: 'controller',
    header: 'Controller',
    sortFn: 'text',
  }),
  helper.accessor((row) => (row.hasWiperProbe ? 'yes' : 'no'), { id: 'probe', header: 'Wiper probe', sortFn: 'text' }),
  helper.accessor((row) => row.printer ?? 'none', { id: 'printer', header: 'Printer', sortFn: 'text' }),
  helper.accessor('enrolledBrowsers', {
    header: 'Browsers',
    meta: { number: true },
    cell: ({ getValue }) => count(getValue()),
  }),
  helper.accessor((row) => row.retiredIso ?? '', {
    id: 'state',
    header: 'State',
    sortFn: 'text',
    cell: ({ row }) =>
      row.original.retiredIso ? (
        <>
          retired <Time iso={row.original.retiredIso} format="day" />
        </>
      ) : (
        'in use'
      ),
  }),
]);

export function StationsTable({ rows }: { rows: StationTableRow[] }) {
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.code}
      label="Stations"
      empty={{ title: 'There is no station.', text: 'Add the first one.' }}
    />
  );
}
