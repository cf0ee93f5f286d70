import type { Metadata } from 'next';
import { AdministrationTabs } from '@/components/people/administration-tabs';
import { PrintersPanel } from '@/components/people/printers-panel';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listPrinterSettings } from '@/server/operations/stations/printers';
import { retirePrinterAction, savePrinterAction } from './actions';

export const metadata: Metadata = { title: 'Printers' };

export default async function PrintersPage() {
  await authorise('manage-printers');
  return (
    <>
      <PageHead title="Printers" tabs={<AdministrationTabs />} />
      <PrintersPanel rows={await listPrinterSettings()} save={savePrinterAction} retire={retirePrinterAction} />
    </>
  );
}
