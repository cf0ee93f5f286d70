import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { HoldHistory } from '@/components/desk/holds/hold-history';
import { SuspectList } from '@/components/desk/holds/suspect-list';
import { count } from '@/components/desk/numbers';
import { PrintButton } from '@/components/desk/print-button';
import { ButtonLink } from '@/components/ui/button';
import { PageHead, Section } from '@/components/ui/page-head';
import { authorise } from '@/server/auth/authorise';
import { readLotHolds } from '@/server/operations/holds/read-lot-holds';

interface Props {
  params: Promise<{ code: string }>;
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  return { title: `Holds of lot ${decodeURIComponent((await params).code)}` };
}

export default async function LotHoldsPage({ params }: Props) {
  await authorise('signed-in');
  const page = await readLotHolds(decodeURIComponent((await params).code));
  if (!page) notFound();
  const { code, boardTypeCode, suspects, holds } = page;
  return (
    <div className="max-w-[960px]">
      <PageHead
        title={`Holds of lot ${code}`}
        actions={
          <>
            <PrintButton kind="outlined">Print</PrintButton>
            <ButtonLink className="sw-screen-only" href={`/lots/${encodeURIComponent(code)}`}>
              Back to the lot
            </ButtonLink>
          </>
        }
      />
      {suspects ? (
        <Section title={`Suspect boards: ${count(suspects.boards.length)}`}>
          <SuspectList suspects={suspects} boardTypeCode={boardTypeCode} />
        </Section>
      ) : null}
      <Section title="Holds, newest first">
        <HoldHistory holds={holds} />
      </Section>
    </div>
  );
}
