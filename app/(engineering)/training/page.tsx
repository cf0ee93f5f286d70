import type { Metadata } from 'next';
import { EngineeringTabs } from '@/components/desk/engineering/engineering-tabs';
import { TrainingPanel } from '@/components/desk/engineering/training-panel';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readTrainings } from '@/server/operations/engineering/trainings';
import { recordTrainingAction } from './actions';

export const metadata: Metadata = { title: 'Training' };

export default async function TrainingPage() {
  const actor = await authorise('signed-in');
  const { people, boardTypes } = await readTrainings();
  return (
    <>
      <PageHead title="Training" tabs={<EngineeringTabs current="/training" />} />
      <TrainingPanel
        people={people}
        boardTypes={boardTypes}
        nowIso={new Date().toISOString()}
        record={actorMay(actor, 'record-training') ? recordTrainingAction : null}
      />
    </>
  );
}
