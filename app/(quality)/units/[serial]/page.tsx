import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { UnitLive } from '@/components/desk/units/unit-live';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readUnitPage } from '@/server/operations/units/read-unit-page';
import { orderRetestAction, printLabelAgainAction, signDispositionAction } from '../actions';

interface Props {
  params: Promise<{ serial: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Board ${decodeURIComponent((await params).serial)}` };
}

export default async function UnitPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const unit = await readUnitPage(decodeURIComponent((await params).serial));
  if (!unit) notFound();
  return (
    <UnitLive
      initial={unit}
      signer={actor.name}
      may={{
        print: actorMay(actor, 'print-labels'),
        decide: actorMay(actor, 'sign-dispositions'),
        order: actorMay(actor, 'order-retests'),
      }}
      actions={{ print: printLabelAgainAction, decide: signDispositionAction, order: orderRetestAction }}
    />
  );
}
