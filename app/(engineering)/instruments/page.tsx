import type { Metadata } from 'next';
import { EngineeringTabs } from '@/components/desk/engineering/engineering-tabs';
import { InstrumentsPanel } from '@/components/desk/engineering/instruments-panel';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { authorise } from '@/server/auth/authorise';
import { readInstruments } from '@/server/operations/engineering/instruments';
import { addInstrumentAction, changeInstrumentAction, recordCalibrationAction } from './actions';

export const metadata: Metadata = { title: 'Instruments' };

export default async function InstrumentsPage() {
  const actor = await authorise('signed-in');
  const { instruments, certificates, stations } = await readInstruments();
  return (
    <>
      <PageHead title="Instruments" tabs={<EngineeringTabs current="/instruments" />} />
      <InstrumentsPanel
        instruments={instruments.map(({ retiredAt, ...instrument }) => ({
          ...instrument,
          retired: retiredAt !== null,
        }))}
        certificates={certificates.map(({ enteredAt, ...row }) => ({ ...row, enteredIso: enteredAt.toISOString() }))}
        stations={stations}
        today={new Date().toISOString().slice(0, 10)}
        actions={
          actorMay(actor, 'manage-instruments')
            ? { add: addInstrumentAction, change: changeInstrumentAction, record: recordCalibrationAction }
            : null
        }
      />
    </>
  );
}
