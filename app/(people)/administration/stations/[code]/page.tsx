import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Time } from '@/components/desk/time';
import { BenchBrowsers } from '@/components/people/bench-browsers';
import { StationSettingsForm } from '@/components/people/station-form';
import { StationStateButton } from '@/components/people/station-state-button';
import { ButtonLink } from '@/components/ui/button';
import { PageHead, Section } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listPrinterChoices, readStationSettings } from '@/server/operations/stations/read-station-settings';
import {
  changeStationAction,
  enrolBrowserAction,
  retireStationAction,
  returnStationAction,
  revokeBrowsersAction,
} from '../actions';

export const metadata: Metadata = { title: 'Station' };

export default async function StationPage({ params }: { params: Promise<{ code: string }> }) {
  await authorise('manage-stations');
  const { code } = await params;
  const [station, printers] = await Promise.all([readStationSettings(code), listPrinterChoices()]);
  if (!station) notFound();
  const { form, retiredIso, enrolledBrowsers } = station;
  return (
    <>
      <PageHead
        title={form.name}
        lede={
          retiredIso ? (
            <>
              Out of use since <Time iso={retiredIso} format="day" />.
            </>
          ) : null
        }
        actions={
          <>
            <ButtonLink href={`/administration/stations/${code}/bin`}>Print the bin’s card</ButtonLink>
            <StationStateButton
              code={code}
              retired={retiredIso !== null}
              act={retiredIso ? returnStationAction : retireStationAction}
            />
          </>
        }
      />
      <div className="grid items-start gap-x-14 xl:grid-cols-[minmax(0,720px)_minmax(320px,1fr)]">
        <StationSettingsForm isNew={false} start={form} printers={printers} save={changeStationAction} />
        <div className="xl:-mt-8">
          <Section title="Browsers at this bench">
            <BenchBrowsers
              code={code}
              enrolled={enrolledBrowsers}
              enrolHere={enrolBrowserAction}
              revokeAll={revokeBrowsersAction}
            />
          </Section>
        </div>
      </div>
    </>
  );
}
