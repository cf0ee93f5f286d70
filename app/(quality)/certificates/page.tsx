import type { Metadata } from 'next';
import { AddressText } from '@/components/desk/address-text';
import { CertificateTable } from '@/components/desk/certificates/certificate-table';
import { count } from '@/components/desk/numbers';
import { PageHead, Toolbar } from '@/components/ui/page-head';
import { certificateFilterSchema } from '@/lib/contracts/certificate';
import { authorise } from '@/server/auth/authorise';
import { listCertificates } from '@/server/operations/certificates/list-certificates';

export const metadata: Metadata = { title: 'Certificates' };

interface Props {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

export default async function CertificatesPage({ searchParams }: Props) {
  await authorise('signed-in');
  const { find } = certificateFilterSchema.parse(await searchParams);
  const rows = await listCertificates(find);
  return (
    <>
      <PageHead title="Certificates" lede="Every paper that left the building, and whether it still counts." />
      <Toolbar
        count={
          <span>
            <b>{count(rows.length)}</b> shown
          </span>
        }
      >
        Show certificates with{' '}
        <AddressText name="find" label="Part of a number, serial number or lot" value={find ?? ''} /> in number, serial
        or lot
      </Toolbar>
      <div className="mt-6">
        <CertificateTable rows={rows} find={find} />
      </div>
    </>
  );
}
