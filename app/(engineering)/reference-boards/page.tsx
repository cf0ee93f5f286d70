import type { Metadata } from 'next';
import { EngineeringTabs } from '@/components/desk/engineering/engineering-tabs';
import { ReferenceBoardsPanel } from '@/components/desk/engineering/reference-boards-panel';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readReferenceBoards } from '@/server/operations/engineering/reference-boards';
import { addReferenceBoardAction, changeReferenceBoardAction } from './actions';

export const metadata: Metadata = { title: 'Reference boards' };

export default async function ReferenceBoardsPage() {
  const actor = await authorise('signed-in');
  const { boards, boardTypes } = await readReferenceBoards();
  return (
    <>
      <PageHead title="Reference boards" tabs={<EngineeringTabs current="/reference-boards" />} />
      <ReferenceBoardsPanel
        boards={boards.map(({ retiredAt, ...board }) => ({ ...board, retired: retiredAt !== null }))}
        boardTypes={boardTypes}
        actions={
          actorMay(actor, 'set-daily-check')
            ? { add: addReferenceBoardAction, change: changeReferenceBoardAction }
            : null
        }
      />
    </>
  );
}
