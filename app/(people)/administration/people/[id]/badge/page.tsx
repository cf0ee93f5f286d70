import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PrintButton } from '@/components/desk/print-button';
import { BarcodeCard } from '@/components/people/barcode-card';
import { ButtonLink } from '@/components/ui/button';
import { PageHead } from '@/components/ui/page-head';
import { roleWords } from '@/lib/access/role-words';
import { authorise } from '@/server/auth/authorise';
import { listPersons } from '@/server/operations/people/list-people';

export const metadata: Metadata = { title: 'Badge' };

export default async function BadgePage({ params }: { params: Promise<{ id: string }> }) {
  await authorise('manage-accounts');
  const { id } = await params;
  const person = (await listPersons()).find((p) => p.accountId === id);
  if (!person?.badgeCode) notFound();
  const roles = person.roles.map((role) => roleWords[role].name).join(', ');
  return (
    <div className="grid gap-6">
      <div className="sw-screen-only">
        <PageHead title={`Badge of ${person.name}`} />
      </div>
      <BarcodeCard
        title={person.name}
        lines={person.operatorNumber ? [`No. ${person.operatorNumber}`, roles] : [roles]}
        code={person.badgeCode}
      />
      <div className="sw-screen-only flex flex-wrap items-center gap-5">
        <PrintButton>Print the badge</PrintButton>
        <ButtonLink kind="link" href={`/administration/people?who=${id}`}>
          Back to the people
        </ButtonLink>
      </div>
    </div>
  );
}
