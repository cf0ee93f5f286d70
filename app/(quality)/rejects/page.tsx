import type { Metadata } from 'next';
import { RejectList } from '@/components/desk/decisions/reject-list';
import { RejectToolbar } from '@/components/desk/decisions/reject-toolbar';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { actorMay } from '@/lib/access/actor';
import { kindsSignedBy } from '@/lib/access/disposition-kinds';
import { rejectFilterSchema } from '@/lib/contracts/reject-list';
import { authorise } from '@/server/auth/authorise';
import { listReasonChoices } from '@/server/operations/reason-codes/list-reason-choices';
import { listRejectChoices, listRejects } from '@/server/operations/rejects/list-rejects';
import { signDispositionsAction } from '../units/actions';

export const metadata: Metadata = { title: 'Rejects' };

export default async function RejectsPage({
  searchParams,
}: {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const actor = await authorise('signed-in');
  const filter = rejectFilterSchema.parse(await searchParams);
  const [rejects, choices, reasons] = await Promise.all([
    listRejects(filter),
    listRejectChoices(),
    listReasonChoices(),
  ]);
  return (
    <>
      <PageHead
        title="Rejects"
        lede="Every board that waits for a decision, across lots."
        actions={actorMay(actor, 'manage-reason-codes') ? <ButtonLink href="/reason-codes">Reasons</ButtonLink> : null}
      />
      <RejectToolbar filter={filter} total={rejects.total} {...choices} />
      <div className="mt-4">
        <RejectList
          rejects={rejects}
          filter={filter}
          deciding={{
            kinds: kindsSignedBy(actor.roles),
            reasons,
            signer: actor.name,
            sign: signDispositionsAction,
          }}
        />
      </div>
    </>
  );
}
