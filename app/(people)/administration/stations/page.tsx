import type { Metadata } from 'next';
import { AdministrationTabs } from '@/components/people/administration-tabs';
import { StationsTable } from '@/components/people/stations-table';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listStationSettings } from '@/server/operations/stations/read-station-settings';

export const metadata: Metadata = { title: 'Stations' };

export default async function StationSettingsPage() {
  await authorise('manage-stations');
  return (
    <>
      <PageHead
        title="Stations"
        tabs={<AdministrationTabs />}
        actions={
          <ButtonLink kind="filled" href="/administration/stations/new">
            Add a station
          </ButtonLink>
        }
      />
      <StationsTable rows={await listStationSettings()} />
    </>
  );
}
