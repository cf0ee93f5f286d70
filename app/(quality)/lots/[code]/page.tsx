import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { LotLive } from '@/components/desk/lots/lot-live';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { changeLotAction, holdLotAction, recordComponentBatchAction, releaseLotAction } from '../actions';

interface Props {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Lot ${decodeURIComponent((await params).code)}` };
}

export default async function LotPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const lot = await readLotPage(decodeURIComponent((await params).code));
  if (!lot) notFound();
  return (
    <LotLive
      initial={lot}
      mayManage={actorMay(actor, 'manage-lots')}
      mayHold={actorMay(actor, 'hold-lots')}
      actions={{
        change: changeLotAction,
        hold: holdLotAction,
        release: releaseLotAction,
        recordBatch: recordComponentBatchAction,
      }}
    />
  );
}
