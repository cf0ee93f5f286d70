import { findCertificate } from '@/db/queries/certificates';
import { objectStore } from '@/server/files/storage/object-store';
import { database } from '@/server/postgres';

/** The stored PDF of a certificate as it comes, or null when there is none. Throws when the storage does not answer. */
export async function readCertificatePdf(
  id: string,
): Promise<{ number: string; sha256: string; body: ReadableStream } | null> {
  const certificate = await findCertificate(database(), id);
  const body = certificate && (await objectStore()?.get(certificate.storageKey));
  return certificate && body ? { number: certificate.number, sha256: certificate.sha256, body } : null;
}
