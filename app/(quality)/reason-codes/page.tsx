import type { Metadata } from 'next';
import { ReasonCodes } from '@/components/desk/reason-codes/reason-codes';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listReasonCodeRows } from '@/server/operations/reason-codes/list-reason-codes';
import { addReasonCodeAction, mergeReasonCodeAction, retireReasonCodeAction } from './actions';

export const metadata: Metadata = { title: 'Reasons' };

export default async function ReasonCodesPage() {
  await authorise('manage-reason-codes');
  return (
    <>
      <PageHead
        title="Reasons"
        lede="What people choose from when they decide about boards and lots. Records keep the word they were signed with."
      />
      <ReasonCodes
        rows={await listReasonCodeRows()}
        actions={{ add: addReasonCodeAction, retire: retireReasonCodeAction, merge: mergeReasonCodeAction }}
      />
    </>
  );
}
