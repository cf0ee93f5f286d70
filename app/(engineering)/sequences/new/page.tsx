import type { Metadata } from 'next';
import { NewSequenceForm } from '@/components/desk/sequences/new-sequence-form';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listBoardTypeChoices } from '@/server/operations/engineering/sequences/list-sequences';
import { newSequenceAction } from '../actions';

export const metadata: Metadata = { title: 'Make a sequence' };

export default async function NewSequencePage() {
  await authorise('edit-sequences');
  const types = await listBoardTypeChoices();
  return (
    <>
      <PageHead title="Make a sequence" />
      {types.length === 0 ? (
        <EmptyState title="There is no board type.">A sequence is for one. Make the board type first.</EmptyState>
      ) : (
        <NewSequenceForm types={types} make={newSequenceAction} />
      )}
    </>
  );
}
