import type { Metadata } from 'next';
import { ImportButton } from '@/components/desk/sequences/import-button';
import { SequenceListTable } from '@/components/desk/sequences/sequence-list-table';
import { SequenceToolbar } from '@/components/desk/sequences/sequence-toolbar';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { sequenceFilterSchema, type SequenceFilter, type SequenceListRow } from '@/lib/contracts/sequence-pages';
import { authorise } from '@/server/auth/authorise';
import { listBoardTypeChoices, listSequencesForDesk } from '@/server/operations/engineering/sequences/list-sequences';
import { importSequenceAction } from './actions';

export const metadata: Metadata = { title: 'Sequences' };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

function shows({ state, type, named }: SequenceFilter, row: SequenceListRow): boolean {
  const inState = {
    all: true,
    draft: row.draft?.state === 'draft',
    waiting: row.draft?.state === 'submitted',
    unreleased: row.inUse === null,
  }[state];
  return (
    inState &&
    (type === null || row.boardTypeCode === type) &&
    `${row.name} ${row.boardTypeName}`.toLowerCase().includes(named.toLowerCase())
  );
}

export default async function SequencesPage({ searchParams }: Props) {
  const actor = await authorise('signed-in');
  const filter = sequenceFilterSchema.parse(await searchParams);
  const [rows, types] = await Promise.all([listSequencesForDesk(), listBoardTypeChoices()]);
  const shown = rows.filter((row) => shows(filter, row));
  return (
    <>
      <PageHead
        title="Sequences"
        actions={
          actorMay(actor, 'edit-sequences') ? (
            <>
              <ImportButton sequenceId={null} send={importSequenceAction} />
              <ButtonLink kind="filled" href="/sequences/new">
                Make a sequence
              </ButtonLink>
            </>
          ) : null
        }
      />
      <SequenceToolbar filter={filter} types={types} shown={shown.length} all={rows.length} />
      <div className="mt-4">
        <SequenceListTable rows={shown} />
      </div>
    </>
  );
}
