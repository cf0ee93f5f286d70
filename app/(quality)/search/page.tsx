import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { count } from '@/components/desk/numbers';
import { lotStateWords } from '@/components/desk/words';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHead, Section } from '@/components/ui/page-head';
import { SerialStrip } from '@/components/ui/serial-strip';
import { Table, Td, Th } from '@/components/ui/table';
import { authorise } from '@/server/auth/authorise';
import { searchEverywhere } from '@/server/operations/units/search';

export const metadata: Metadata = { title: 'Search' };

/** An exact serial or lot opens at once; a part of one lists what contains it. */
export default async function SearchPage({ searchParams }: { searchParams: Promise<{ q?: string | string[] }> }) {
  await authorise('signed-in');
  const { q } = await searchParams;
  const entered = (typeof q === 'string' ? q : '').slice(0, 60);
  const { exact, text, units, lots, more } = await searchEverywhere(entered);
  if (exact?.kind === 'unit') redirect(`/units/${encodeURIComponent(exact.serial)}`);
  if (exact?.kind === 'lot') redirect(`/lots/${encodeURIComponent(exact.code)}`);
  if (units.length === 1 && lots.length === 0) redirect(`/units/${encodeURIComponent(units[0]!.serial)}`);
  return (
    <>
      <PageHead
        title={text ? `Boards and lots with “${text}”` : 'Search'}
        lede={more ? 'There are more. Type more of the number to see them.' : undefined}
      />
      {text === '' ? (
        <EmptyState title="Nothing to look for yet.">
          Press / and type a part of a serial number or lot, or scan it.
        </EmptyState>
      ) : units.length === 0 && lots.length === 0 ? (
        <EmptyState title={`No board or lot contains “${text}”.`}>
          Check the number. Boards appear as soon as their lot is made.
        </EmptyState>
      ) : null}
      {units.length > 0 ? (
        <Section title={`${count(units.length)} ${units.length === 1 ? 'board' : 'boards'}`}>
          <Table>
            <thead>
              <tr>
                <Th>Serial</Th>
                <Th>Lot</Th>
                <Th>Board type</Th>
              </tr>
            </thead>
            <tbody>
              {units.map((unit) => (
                <tr key={unit.serial}>
                  <Td label="Serial">
                    <Link className="sw-link" href={`/units/${encodeURIComponent(unit.serial)}`}>
                      <SerialStrip serial={unit.serial} boardTypeCode={unit.boardTypeCode} />
                    </Link>
                  </Td>
                  <Td label="Lot" className="font-num">
                    {unit.lotCode}
                  </Td>
                  <Td label="Board type" className="font-num">
                    {unit.boardTypeCode}
                  </Td>
                </tr>
              ))}
            </tbody>
          </Table>
        </Section>
      ) : null}
      {lots.length > 0 ? (
        <Section title={`${count(lots.length)} ${lots.length === 1 ? 'lot' : 'lots'}`}>
          <Table>
            <thead>
              <tr>
                <Th>Lot</Th>
                <Th>State</Th>
                <Th>Board type</Th>
                <Th>Boards</Th>
              </tr>
            </thead>
            <tbody>
              {lots.map((lot) => (
                <tr key={lot.code}>
                  <Td label="Lot">
                    <Link className="sw-link font-num font-bold" href={`/lots/${encodeURIComponent(lot.code)}`}>
                      {lot.code}
                    </Link>
                  </Td>
                  <Td label="State">{lotStateWords[lot.state]}</Td>
                  <Td label="Board type" className="font-num">
                    {lot.boardTypeCode}
                  </Td>
                  <Td label="Boards">{count(lot.size)}</Td>
                </tr>
              ))}
            </tbody>
          </Table>
        </Section>
      ) : null}
    </>
  );
}
