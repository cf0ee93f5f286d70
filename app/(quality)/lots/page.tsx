import type { Metadata } from 'next';
import { FirstLot } from '@/components/desk/lots/first-lot';
import { LotListTable } from '@/components/desk/lots/lot-list-table';
import { LotToolbar } from '@/components/desk/lots/lot-toolbar';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { lotFilterSchema, lotSpans } from '@/lib/contracts/lot-filter';
import { authorise } from '@/server/auth/authorise';
import { listLotsForDesk } from '@/server/operations/lots/list-lots';
import { readFirstLotSteps } from '@/server/operations/lots/read-first-lot-steps';

export const metadata: Metadata = { title: 'Lots' };

const dayMs = 24 * 3600 * 1000;

export default async function LotsPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const actor = await authorise('signed-in');
  const filter = lotFilterSchema.parse(await searchParams);
  const days = lotSpans[filter.from];
  const { rows, stations, bases } = await listLotsForDesk({
    state: filter.state,
    stationCode: filter.station,
    since: days === null ? null : new Date(new Date().getTime() - days * dayMs),
  });
  const first = rows.length === 0 ? await readFirstLotSteps() : null;
  const mayManage = actorMay(actor, 'manage-lots');
  return (
    <>
      <PageHead
        title="Lots"
        actions={
          mayManage && bases.length > 0 ? (
            <ButtonLink kind="filled" href="/lots/new">
              Make a lot
            </ButtonLink>
          ) : null
        }
      />
      <LotToolbar filter={filter} stations={stations} shown={rows.length} />
      <div className="mt-6">
        {first && !first.anyLot ? (
          <FirstLot steps={first} mayManage={mayManage} />
        ) : (
          <LotListTable
            rows={rows}
            nothing={{ title: 'No lot is shown.', text: 'Choose other states, stations or days above.' }}
          />
        )}
      </div>
    </>
  );
}
