import type { Metadata } from 'next';
import { AddressChoice } from '@/components/desk/address-choice';
import { AddressDate } from '@/components/desk/address-date';
import { AddressText } from '@/components/desk/address-text';
import { CopyAddress } from '@/components/desk/copy-address';
import { count } from '@/components/desk/numbers';
import { PrintButton } from '@/components/desk/print-button';
import { TrailOlder } from '@/components/desk/trail/trail-older';
import { TrailTable } from '@/components/desk/trail/trail-table';
import { VerifyTrail } from '@/components/desk/trail/verify-trail';
import { PageHead, Toolbar } from '@/components/ui/page-head';
import { trailFilterSchema } from '@/lib/contracts/trail-page';
import { actionWords } from '@/lib/trail/entry-words';
import { authorise } from '@/server/auth/authorise';
import { readTrailPage } from '@/server/operations/trail/read-trail-page';
import { verifyTrailAction } from './actions';

export const metadata: Metadata = { title: 'Audit trail' };

export default async function TrailPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  await authorise('read-trail');
  const filter = trailFilterSchema.parse(await searchParams);
  const page = await readTrailPage(filter);
  const things = page.entities.map((entity) => ({ value: entity, label: actionWords(entity).toLowerCase() }));
  const people = page.people.map(({ id, name }) => ({ value: id, label: name }));
  return (
    <>
      <PageHead
        title="Audit trail"
        lede="Who changed what, when and why. Entries are only ever added; each is sealed by the one before it."
        actions={<PrintButton kind="outlined">Print what is shown</PrintButton>}
      />
      <Toolbar
        count={
          <span className="flex items-center gap-4">
            <CopyAddress />
            <span>
              <b>{count(page.rows.length)}</b> of {count(page.total)}
            </span>
          </span>
        }
      >
        Show changes of{' '}
        <AddressChoice
          name="what"
          label="What was changed"
          choices={[{ value: '', label: 'anything' }, ...things]}
          value={filter.what}
        />{' '}
        by{' '}
        <AddressChoice
          name="who"
          label="Who changed it"
          choices={[{ value: '', label: 'anyone' }, ...people]}
          value={filter.who}
        />{' '}
        since <AddressDate name="since" label="Since" value={filter.since} /> containing{' '}
        <AddressText name="containing" label="Containing" value={filter.containing} />
      </Toolbar>
      <VerifyTrail verify={verifyTrailAction} checkpointAtIso={page.checkpointAtIso} />
      <TrailTable rows={page.rows} />
      <TrailOlder older={page.older} newest={filter.before === null} />
    </>
  );
}
