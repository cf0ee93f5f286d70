import { findCertificateForUpdate, revokeOnce } from '@/db/queries/certificates';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { RevokeCertificateForm } from '@/lib/contracts/certificate';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature } from '../signatures/record-signature';

/** Whoever checks the paper reads from now on that it does not count, and why. Codes: wrong-password, too-many-tries, certificate-unknown, certificate-revoked. */
export async function revokeCertificate(
  actor: Actor,
  { certificateId, reason, password }: RevokeCertificateForm,
  at = new Date(),
): Promise<Outcome> {
  const signed = await confirmSignature(actor, password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const certificate = await findCertificateForUpdate(tx, certificateId);
    if (!certificate) return refusal('certificate-unknown', 'This certificate does not exist.');
    const { number } = certificate;
    if (certificate.revokedAt) return refusal('certificate-revoked', `Certificate ${number} is revoked already.`);
    const signature = await recordSignature(
      tx,
      actor,
      {
        subject: 'certificate',
        subjectId: certificateId,
        meaning: 'The certificate is revoked and counts no longer.',
        content: { number, reason },
      },
      at,
    );
    await revokeOnce(tx, certificateId, { revokedAt: at, revokedBy: actor.accountId, revokedReason: reason });
    await insertTrail(tx, actor, {
      action: 'certificate.revoked',
      entity: 'certificate',
      entityId: certificateId,
      before: { number, revoked: false },
      after: { number, revoked: true, digest: signature.digest },
      reason,
    });
    return done;
  });
}
