import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { UnitLive } from '@/components/desk/units/unit-live';
import { actorMay } from '@/lib/access/actor';
import { kindsSignedBy } from '@/lib/access/disposition-kinds';
import { authorise } from '@/server/auth/authorise';
import { listCertificatesFor } from '@/server/operations/certificates/list-certificates';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { listReasonChoices } from '@/server/operations/reason-codes/list-reason-choices';
import { issueCertificateAction, revokeCertificateAction } from '../../certificates/actions';
import { completeConcessionAction, orderRetestAction, printLabelAgainAction, signDispositionsAction } from '../actions';

interface Props {
  params: Promise<{ serial: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Board ${decodeURIComponent((await params).serial)}` };
}

export default async function UnitPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const serial = decodeURIComponent((await params).serial);
  const [unit, reasons] = await Promise.all([readUnitPage(serial), listReasonChoices()]);
  if (!unit) notFound();
  const certificates = await listCertificatesFor({ unitId: unit.id });
  return (
    <UnitLive
      initial={unit}
      viewer={{ accountId: actor.accountId, name: actor.name, roles: actor.roles }}
      deciding={{ kinds: kindsSignedBy(actor.roles), reasons, signer: actor.name, sign: signDispositionsAction }}
      certificates={{
        rows: certificates,
        mayIssue: actorMay(actor, 'issue-certificates'),
        signer: actor.name,
        issue: issueCertificateAction,
        revoke: revokeCertificateAction,
      }}
      may={{
        print: actorMay(actor, 'print-labels'),
        order: actorMay(actor, 'order-retests'),
      }}
      actions={{
        print: printLabelAgainAction,
        complete: completeConcessionAction,
        order: orderRetestAction,
      }}
    />
  );
}
