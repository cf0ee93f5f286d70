import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PrintButton } from '@/components/desk/print-button';
import { BarcodeCard } from '@/components/people/barcode-card';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { readStationSettings } from '@/server/operations/stations/read-station-settings';

export const metadata: Metadata = { title: 'Card of the red bin' };

export default async function BinCardPage({ params }: { params: Promise<{ code: string }> }) {
  await authorise('manage-stations');
  const { code } = await params;
  const station = await readStationSettings(code);
  if (!station) notFound();
  return (
    <div className="grid gap-6">
      <div className="sw-screen-only">
        <PageHead title={`Card of the red bin, ${code}`} />
      </div>
      <BarcodeCard title={`Red bin, ${station.form.code}`} lines={[station.form.name]} code={station.binCode} />
      <div className="sw-screen-only flex flex-wrap items-center gap-5">
        <PrintButton>Print the card</PrintButton>
        <ButtonLink kind="link" href={`/administration/stations/${code}`}>
          Back to the station
        </ButtonLink>
      </div>
    </div>
  );
}
