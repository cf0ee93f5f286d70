import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { StationLive } from '@/components/desk/stations/station-live';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readStationPage } from '@/server/operations/engineering/read-station-page';
import { recordDailyCheckAction } from '../actions';

interface Props {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Station ${decodeURIComponent((await params).code)}` };
}

export default async function StationPage({ params }: Props) {
  const actor = await authorise('signed-in');
  const station = await readStationPage(decodeURIComponent((await params).code));
  if (!station) notFound();
  return (
    <StationLive
      initial={station}
      today={new Date().toISOString().slice(0, 10)}
      recordCheck={actorMay(actor, 'set-daily-check') ? recordDailyCheckAction : null}
    />
  );
}
