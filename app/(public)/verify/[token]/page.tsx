import { notFound } from 'next/navigation';
import { VerifiedCertificate } from '@/components/verify/verified-certificate';
import { VerifyFrame } from '@/components/verify/verify-frame';
import { mayAskAgain } from '@/server/auth/limit-requests';
import { verifyCertificate } from '@/server/operations/certificates/verify-certificate';

/** Public: whoever holds the paper. Shows that certificate and nothing else. */
export default async function VerifiedPage({ params }: { params: Promise<{ token: string }> }) {
  if (!(await mayAskAgain()))
    return (
      <VerifyFrame shape="check" title="Too many checks">
        <p className="mt-4">Wait a minute, then scan the paper again.</p>
      </VerifyFrame>
    );
  const found = await verifyCertificate((await params).token);
  if (!found) notFound();
  const { timeZone, ...certificate } = found;
  return <VerifiedCertificate certificate={certificate} timeZone={timeZone} nowIso={new Date().toISOString()} />;
}
