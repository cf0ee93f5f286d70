import { listCertificatesOf, searchCertificates } from '@/db/queries/certificates';
import type { CertificateRow } from '@/lib/contracts/certificate';
import { database } from '@/server/postgres';
import { certificateRow } from './certificate-rows';

const most = 500;

/** Issued certificates whose number, serial number or lot contains the text, newest first. */
export async function listCertificates(find: string | null): Promise<CertificateRow[]> {
  return (await searchCertificates(database(), find, most)).map(certificateRow);
}

/** Of one board, or of a lot as a whole, newest first. */
export async function listCertificatesFor(subject: { unitId: string } | { lotId: string }): Promise<CertificateRow[]> {
  return (await listCertificatesOf(database(), subject)).map(certificateRow);
}
