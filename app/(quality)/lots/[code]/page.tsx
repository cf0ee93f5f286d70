import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { LotLive } from '@/components/desk/lots/lot-live';
import { actorMay } from '@/lib/access/actor';
import { kindsSignedBy } from '@/lib/access/disposition-kinds';
import { lotViewSchema } from '@/lib/contracts/lot-view';
import { authorise } from '@/server/auth/authorise';
import { listCertificatesFor } from '@/server/operations/certificates/list-certificates';
import { readLotPage } from '@/server/operations/lots/read-lot-page';
import { readLotReview } from '@/server/operations/lots/read-lot-review';
import { listReasonChoices } from '@/server/operations/reason-codes/list-reason-choices';
import { signDispositionsAction } from '../../units/actions';
import { issueCertificateAction, revokeCertificateAction } from '../../certificates/actions';
import {
  changeLotAction,
  chooseBaselineAction,
  holdLotAction,
  moveLotAction,
  recordComponentBatchAction,
  releaseLotAction,
} from '../actions';

interface Props {
  params: Promise<{ code: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Lot ${decodeURIComponent((await params).code)}` };
}

export default async function LotPage({ params, searchParams }: Props) {
  const actor = await authorise('signed-in');
  const code = decodeURIComponent((await params).code);
  const view = lotViewSchema.parse(await searchParams);
  const [lot, review, reasons] = await Promise.all([
    readLotPage(code, view),
    readLotReview(code, view),
    listReasonChoices(),
  ]);
  if (!lot) notFound();
  const certificates = await listCertificatesFor({ lotId: lot.id });
  return (
    <LotLive
      initial={lot}
      initialReview={review}
      certificates={{
        rows: certificates,
        mayIssue: actorMay(actor, 'issue-certificates'),
        signer: actor.name,
        issue: issueCertificateAction,
        revoke: revokeCertificateAction,
      }}
      may={{ manage: actorMay(actor, 'manage-lots'), hold: actorMay(actor, 'hold-lots') }}
      actions={{
        change: changeLotAction,
        hold: holdLotAction,
        release: releaseLotAction,
        recordBatch: recordComponentBatchAction,
        chooseBaseline: chooseBaselineAction,
        move: moveLotAction,
      }}
      deciding={{ kinds: kindsSignedBy(actor.roles), reasons, signer: actor.name, sign: signDispositionsAction }}
    />
  );
}
