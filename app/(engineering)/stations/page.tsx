import type { Metadata } from 'next';
import { StationsLive } from '@/components/desk/stations/stations-live';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readStationsOverview } from '@/server/operations/engineering/read-stations';
import { acknowledgeCallAction } from '../calls/actions';

export const metadata: Metadata = { title: 'Stations' };

export default async function StationsPage() {
  const actor = await authorise('signed-in');
  return (
    <StationsLive
      initial={await readStationsOverview()}
      acknowledge={actorMay(actor, 'acknowledge-calls') ? acknowledgeCallAction : null}
    />
  );
}
