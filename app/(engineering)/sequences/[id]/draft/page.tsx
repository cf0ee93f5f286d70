import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { SequenceEditor } from '@/components/desk/sequence-editor/sequence-editor';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readNewestDryRun } from '@/server/operations/engineering/dry-runs/read-dry-run';
import { listOffersOf } from '@/server/operations/engineering/offers/list-offers';
import { readDraftPage } from '@/server/operations/engineering/sequences/read-draft-page';
import { submitRevisionAction } from '../../actions';
import { askDryRunAction, cancelDryRunAction, keepDryRunAction } from '../../dry-runs/actions';
import { endOfferAction, offerDraftAction } from '../../offers/actions';
import { saveDraftAction } from './actions';

export const metadata: Metadata = { title: 'Draft' };

interface Props {
  params: Promise<{ id: string }>;
}

const isId = (text: string) => /^[0-9a-f-]{36}$/.test(text);

export default async function DraftPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const { id } = await params;
  const page = isId(id) ? await readDraftPage(actor, id) : null;
  if (!page) notFound();
  const [dryRun, offers] = await Promise.all([readNewestDryRun(page.head.id), listOffersOf(page.head.id)]);
  const mayTry = actorMay(actor, 'make-engineering-runs');
  return (
    <SequenceEditor
      key={`${page.head.id}:${page.head.status}`}
      page={page}
      dryRun={dryRun}
      offers={offers}
      actions={{
        save: saveDraftAction,
        submit: submitRevisionAction,
        dryRun: { ask: askDryRunAction, cancel: cancelDryRunAction, keep: keepDryRunAction },
        offer: mayTry ? offerDraftAction : null,
        endOffer: mayTry ? endOfferAction : null,
      }}
    />
  );
}
