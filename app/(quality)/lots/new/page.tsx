import type { Metadata } from 'next';
import { LotForm } from '@/components/desk/lots/lot-form';
import { EmptyState } from '@/components/ui/empty-state';
import { PageHead } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { listBasesForLot } from '@/server/operations/lots/list-lots';
import { checkLotSerialsAction, createLotAction } from '../actions';

export const metadata: Metadata = { title: 'Make a lot' };

export default async function NewLotPage() {
  await authorise('manage-lots');
  const bases = await listBasesForLot();
  return (
    <>
      <PageHead title="Make a lot" />
      {bases.length === 0 ? (
        <EmptyState title="No sequence is released.">
          A lot needs one. An engineer makes it, a second person releases it.
        </EmptyState>
      ) : (
        <LotForm bases={bases} check={checkLotSerialsAction} create={createLotAction} />
      )}
    </>
  );
}
