'use client';

import Link from 'next/link';
import { useSearchParams } from 'next/navigation';
import { DataTable, deskColumns } from '@/components/desk/data-table';
import { Time } from '@/components/desk/time';
import { VerdictMark } from '@/components/ui/verdict-mark';
import { roles, type Role } from '@/lib/access/roles';
import { roleWords } from '@/lib/access/role-words';

export interface PersonTableRow {
  accountId: string;
  name: string;
  /** E-mail, or badge in words. */
  signsInAs: string;
  roles: readonly Role[];
  trainedUntilIso: string | null;
  training: 'valid' | 'soon' | 'ended' | 'none';
  lastSeenIso: string | null;
  state: 'active' | 'waiting' | 'closed';
}

const helper = deskColumns<PersonTableRow>();

const columns = helper.columns([
  helper.accessor('name', {
    header: 'Name',
    sortFn: 'alphanumeric',
    cell: ({ row }) => <NameLink row={row.original} />,
  }),
  helper.accessor('signsInAs', {
    header: 'Signs in as',
    sortFn: 'alphanumeric',
    cell: ({ getValue }) => <span className="text-cap text-ink-2">{getValue()}</span>,
  }),
  ...roles.map((role) =>
    helper.accessor((row) => (row.roles.includes(role) ? '0' : '1'), {
      id: role,
      header: roleWords[role].name,
      sortFn: 'text',
      cell: ({ row }) => <RoleMark held={row.original.roles.includes(role)} />,
    }),
  ),
  helper.accessor((row) => row.trainedUntilIso ?? '', {
    id: 'training',
    header: 'Training until',
    sortFn: 'text',
    cell: ({ row }) => <Training row={row.original} />,
  }),
  helper.accessor((row) => row.lastSeenIso ?? '', {
    id: 'seen',
    header: 'Last seen',
    sortFn: 'text',
    cell: ({ row }) => <LastSeen row={row.original} />,
  }),
]);

function NameLink({ row }: { row: PersonTableRow }) {
  const query = new URLSearchParams(useSearchParams());
  query.set('who', row.accountId);
  return (
    <Link
      className="font-bold whitespace-nowrap hover:text-accent hover:underline"
      href={`/administration/people?${query}`}
      scroll={false}
    >
      {row.name}
    </Link>
  );
}

function RoleMark({ held }: { held: boolean }) {
  return held ? (
    <>
      <span aria-hidden="true" className="inline-block size-4 bg-ink align-middle" />
      <span className="sw-only-read">yes</span>
    </>
  ) : (
    <span className="text-ink-3">–</span>
  );
}

function Training({ row }: { row: PersonTableRow }) {
  if (!row.trainedUntilIso) return <span className="text-ink-3">–</span>;
  const day = <Time iso={row.trainedUntilIso} format="day" />;
  if (row.training === 'valid') return day;
  return (
    <span className={`inline-flex items-center gap-1.5 font-bold ${row.training === 'ended' ? 'text-reject' : ''}`}>
      <VerdictMark shape={row.training === 'ended' ? 'reject' : 'check'} size={14} />
      {row.training === 'ended' ? 'ended' : null} {day}
    </span>
  );
}

function LastSeen({ row }: { row: PersonTableRow }) {
  if (row.state === 'closed') return <span>closed</span>;
  if (row.state === 'waiting')
    return (
      <span className="inline-flex items-center gap-1.5 font-bold">
        <VerdictMark shape="reject" size={14} /> locked
      </span>
    );
  return row.lastSeenIso ? <Time iso={row.lastSeenIso} format="day" /> : <span className="text-ink-3">never</span>;
}

export function PeopleTable({ rows, chosen }: { rows: PersonTableRow[]; chosen: string | null }) {
  return (
    <DataTable
      rows={rows}
      columns={columns}
      rowKey={(row) => row.accountId}
      label="People"
      chosen={chosen}
      empty={{ title: 'Nobody is shown.', text: 'Choose another state, role or name above.' }}
    />
  );
}
