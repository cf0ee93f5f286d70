import type { Metadata } from 'next';
import { BoardTypeList } from '@/components/desk/board-types/board-type-list';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { listBoardTypeRows } from '@/server/operations/engineering/board-types/list-board-types';

export const metadata: Metadata = { title: 'Board types' };

export default async function BoardTypesPage() {
  const actor = await authorise('signed-in');
  return (
    <>
      <PageHead
        title="Board types"
        lede="What a board is made of, and which limits it has to meet. New lots take the revision in use; open lots keep theirs."
        actions={
          actorMay(actor, 'edit-board-types') ? <ButtonLink href="/board-types/new">New board type</ButtonLink> : null
        }
      />
      <BoardTypeList rows={await listBoardTypeRows()} />
    </>
  );
}
