import type { Metadata } from 'next';
import { AddressChoice } from '@/components/desk/address-choice';
import { CopyAddress } from '@/components/desk/copy-address';
import { count } from '@/components/desk/numbers';
import { UnitListTable } from '@/components/desk/units/unit-list-table';
import { ButtonLink } from '@/components/ui/button';
import { PageHead, Toolbar } from '@/components/ui/page-head';
import { unitFilterSchema, type UnitFilter } from '@/lib/contracts/unit-filter';
import { authorise } from '@/server/auth/authorise';
import { listUnitsForDesk } from '@/server/operations/units/list-units';

export const metadata: Metadata = { title: 'Units' };

const choices = [
  { value: 'all', label: 'all runs' },
  { value: 'reject', label: 'rejects' },
  { value: 'no-verdict', label: 'runs without a verdict' },
  { value: 'pass', label: 'passes' },
];
const nothing: Record<UnitFilter['show'], { title: string; text?: string }> = {
  reject: { title: 'No board was rejected.' },
  'no-verdict': { title: 'No run ended without a verdict.' },
  pass: { title: 'No board has passed yet.' },
  all: { title: 'No board was tested yet.', text: 'The first one appears here as soon as its test ends.' },
};

export default async function UnitsPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  await authorise('signed-in');
  const { show, station } = unitFilterSchema.parse(await searchParams);
  const { rows, stations } = await listUnitsForDesk({ verdict: show === 'all' ? null : show, stationCode: station });
  const places = [{ value: '', label: 'all stations' }, ...stations.map(({ code }) => ({ value: code, label: code }))];
  return (
    <>
      <PageHead
        title="Units"
        lede="Any board is found by its serial number: press / and type or scan it."
        actions={<ButtonLink href="/certificates">Certificates</ButtonLink>}
      />
      <Toolbar
        count={
          <span className="flex items-center gap-4">
            {show !== 'all' || station ? <CopyAddress /> : null}
            <span>
              <b>{count(rows.length)}</b> shown
            </span>
          </span>
        }
      >
        Show <AddressChoice name="show" label="What is shown" choices={choices} value={show} /> of{' '}
        <AddressChoice name="station" label="Station" choices={places} value={station ?? ''} />
      </Toolbar>
      <div className="mt-6">
        <UnitListTable rows={rows} nothing={nothing[show]} />
      </div>
    </>
  );
}
