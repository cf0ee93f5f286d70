import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { LotBarcode } from '@/components/desk/lots/lot-barcode';
import { PrintButton } from '@/components/desk/print-button';
import { Time } from '@/components/desk/time';
import { ButtonLink } from '@/components/ui/button';
import { Mark } from '@/components/ui/mark';
import { Table, Td, Th } from '@/components/ui/table';
import { serialGroups } from '@/lib/barcode/serial-groups';
import { authorise } from '@/server/auth/authorise';
import { readLotPage } from '@/server/operations/lots/read-lot-page';

interface Props {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Sheet of lot ${decodeURIComponent((await params).code)}` };
}

/** A page of A4 that travels with the boards. Its barcode opens the lot at a bench. */
export default async function LotSheetPage({ params }: Props) {
  await authorise('signed-in');
  const lot = await readLotPage(decodeURIComponent((await params).code));
  if (!lot) notFound();
  const spoken = (serial: string | null) => (serial ? serialGroups(serial, lot.boardTypeCode).join(' ') : '');
  const facts: [string, string][] = [
    ['Board type', `${lot.boardTypeCode}, ${lot.boardTypeName}`],
    ['Sequence', `r${lot.sequenceNumber}`],
    ['Boards', String(lot.summary.size)],
    ['First serial', spoken(lot.firstSerial)],
    ['Last serial', spoken(lot.lastSerial)],
    ['Made by', lot.createdByName],
  ];
  // The newest batch of each component.
  const batches = [...new Map(lot.components.map((batch) => [batch.component, batch])).values()];
  return (
    <article className="max-w-[760px]">
      <div className="sw-screen-only mb-6 flex flex-wrap gap-4">
        <PrintButton>Print the sheet</PrintButton>
        <ButtonLink kind="link" href={`/lots/${encodeURIComponent(lot.code)}`}>
          Back to the lot
        </ButtonLink>
      </div>
      <div className="flex items-start justify-between gap-6 border-b-2 border-ink pb-4">
        <div>
          <p className="text-ink-2">Lot</p>
          <h1 className="font-num text-[56px] leading-none font-bold">{lot.code}</h1>
        </div>
        <Mark size={56} title="Sillwright" />
      </div>
      <div className="my-6">
        <LotBarcode code={lot.code} />
        <p className="mt-1">Scan this at the bench to begin the lot.</p>
      </div>
      <dl className="grid grid-cols-[140px_1fr] gap-y-1.5 border-t border-rule pt-4 text-[17px]">
        {facts.map(([name, value]) => (
          <div key={name} className="contents">
            <dt className="text-ink-2">{name}</dt>
            <dd className="font-bold">{value}</dd>
          </div>
        ))}
        <dt className="text-ink-2">Made</dt>
        <dd className="font-bold">
          <Time iso={lot.createdAtIso} />
        </dd>
      </dl>
      <h2 className="mt-6 font-bold">Component batches</h2>
      <Table stacks={false}>
        <thead>
          <tr>
            <Th>Component</Th>
            <Th>Batch</Th>
            <Th>Changed to, by, at</Th>
          </tr>
        </thead>
        <tbody>
          {batches.map((batch) => (
            <tr key={batch.id}>
              <Td>{batch.component}</Td>
              <Td className="font-num font-bold">{batch.batch}</Td>
              <Td />
            </tr>
          ))}
          {/* Room to write by hand where a bench screen is out of reach. */}
          {Array.from({ length: 3 }, (_, i) => (
            <tr key={i}>
              <Td />
              <Td />
              <Td />
            </tr>
          ))}
        </tbody>
      </Table>
      <p className="mt-8 border-t border-rule pt-3 text-cap text-ink-2">
        Boards are sensitive to electrostatic discharge: handle them at a protected place. The site’s own safety rules
        come first.
      </p>
    </article>
  );
}
