import type { Metadata } from 'next';
import { StationSettingsForm } from '@/components/people/station-form';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listPrinterChoices } from '@/server/operations/stations/read-station-settings';
import { addStationAction } from '../actions';

export const metadata: Metadata = { title: 'Add a station' };

export default async function AddStationPage() {
  await authorise('manage-stations');
  return (
    <>
      <PageHead title="Add a station" />
      <StationSettingsForm
        isNew
        printers={await listPrinterChoices()}
        save={addStationAction}
        start={{
          code: '',
          name: '',
          fixture: '',
          scheme: 'system',
          hasWiperProbe: false,
          printerId: '',
          mainsHz: '50',
          linkKind: 'serial',
          baudRate: '115200',
          hasController: true,
          seed: '0',
          supplyPath: '',
          meterPath: '',
          controllerPath: '',
        }}
      />
    </>
  );
}
