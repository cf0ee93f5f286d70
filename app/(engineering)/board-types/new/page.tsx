import type { Metadata } from 'next';
import { NewBoardTypeForm } from '@/components/desk/board-types/new-board-type-form';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listBoardTypeRows } from '@/server/operations/engineering/board-types/list-board-types';
import { newBoardTypeAction } from '../actions';

export const metadata: Metadata = { title: 'New board type' };

export default async function NewBoardTypePage() {
  await authorise('edit-board-types');
  const rows = await listBoardTypeRows();
  return (
    <>
      <PageHead title="New board type" lede="It is a draft until quality approves its limits." />
      <NewBoardTypeForm models={rows.map(({ code, name }) => ({ code, name }))} make={newBoardTypeAction} />
    </>
  );
}
