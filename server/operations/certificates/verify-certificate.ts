import { timingSafeEqual } from 'node:crypto';
import { findCertificateByToken } from '@/db/queries/certificates';
import type { VerifiedCertificate } from '@/lib/contracts/certificate';
import { database } from '@/server/postgres';
import { validityOf } from './certificate-rows';
import { certificateTokenHash } from './certificate-token';
import { certificateTimeZone } from './certificate-time-zone';
import { sealOf } from './issue-certificate';

/** The certificate of a token and whether it counts; null when there is none. Nobody is signed in: nothing else is read. */
export async function verifyCertificate(token: string): Promise<(VerifiedCertificate & { timeZone: string }) | null> {
  const asked = certificateTokenHash(token);
  if (!asked) return null;
  const db = database();
  const found = await findCertificateByToken(db, asked);
  // Looked up by its hash, a token is not told from another by the time the answer takes; compared once more all the same.
  if (!found || !timingSafeEqual(Buffer.from(found.tokenHash), Buffer.from(asked))) return null;
  return {
    number: found.number,
    issuedIso: found.issuedAt.toISOString(),
    issuedByName: found.issuedByName,
    seal: sealOf(found.digest),
    content: found.content,
    validity: validityOf(found),
    timeZone: certificateTimeZone,
  };
}
