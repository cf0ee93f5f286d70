import { createHash, randomUUID } from 'node:crypto';
import { insertCertificate } from '@/db/queries/certificates';
import { findLotForUpdate } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { canonicalJson } from '@/lib/canonical-json';
import type { IssueCertificateForm } from '@/lib/contracts/certificate';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { environment } from '@/server/environment';
import { certificatePdf } from '@/server/files/certificates/certificate-pdf';
import { objectStore } from '@/server/files/storage/object-store';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { digestOf, recordSignature } from '../signatures/record-signature';
import { sha256 } from '../trail/sha256';
import { prepareCertificate } from './certificate-subject';
import { certificateTimeZone } from './certificate-time-zone';
import { certificateTokenHash, newCertificateToken } from './certificate-token';

const meaning = 'The certificate states what is on record of its boards. It may leave the building.';

/**
 * Issues a certificate of a board or a lot, signed with the password. Its content is frozen, its PDF stored; the token is only on the
 * paper. Codes: wrong-password, too-many-tries, storage-missing, storage-silent, changed-meanwhile, and those of `prepareCertificate`.
 */
export async function issueCertificate(
  actor: Actor,
  form: IssueCertificateForm,
  at = new Date(),
): Promise<Outcome<{ id: string; number: string }>> {
  const db = database();
  const prepared = await prepareCertificate(db, form);
  if (!prepared.ok) return prepared;
  const store = objectStore();
  if (!store)
    return refusal('storage-missing', 'No file storage is set up here. Ask whoever runs the server to give S3_BUCKET.');
  const signed = await confirmSignature(actor, form.password);
  if (!signed.ok) return signed;

  const { number, content, unitId, lotId } = prepared.value;
  const token = newCertificateToken();
  // The whole content may be megabytes for a lot: its digest binds the signature to it.
  const toSign = { number, kind: content.kind, lot: content.lotCode, boards: content.boards.length };
  const signedContent = { ...toSign, contentSha256: sha256(canonicalJson(content)) };
  const pdf = await certificatePdf({
    number,
    content,
    issuedIso: at.toISOString(),
    issuedByName: actor.name,
    seal: sealOf(digestOf(signedContent)),
    verifyUrl: `${environment().publicUrl}/verify/${token}`,
    timeZone: certificateTimeZone,
  });
  const storageKey = `certificates/${randomUUID()}.pdf`;
  try {
    await store.put(storageKey, pdf, 'application/pdf');
  } catch {
    return refusal('storage-silent', 'The file storage did not take the certificate. Try again in a moment.');
  }

  return db.transaction(async (tx) => {
    await findLotForUpdate(tx, lotId);
    const still = await prepareCertificate(tx, form);
    if (!still.ok) return still;
    if (still.value.number !== number || canonicalJson(still.value.content) !== canonicalJson(content))
      return refusal(
        'changed-meanwhile',
        'The record changed meanwhile. Look at it again, then issue the certificate.',
      );
    const id = randomUUID();
    const signature = await recordSignature(
      tx,
      actor,
      { subject: 'certificate', subjectId: id, meaning, content: signedContent },
      at,
    );
    await insertCertificate(tx, {
      id,
      number,
      unitId,
      lotId,
      content,
      tokenHash: certificateTokenHash(token)!,
      storageKey,
      sha256: createHash('sha256').update(pdf).digest('hex'),
      issuedBy: actor.accountId,
      issuedAt: at,
      signatureId: signature.id,
    });
    await insertTrail(tx, actor, {
      action: 'certificate.issued',
      entity: 'certificate',
      entityId: id,
      after: { ...signedContent, digest: signature.digest },
    });
    return success({ id, number });
  });
}

/** As much of a signature's digest as is printed, to compare by eye. */
export function sealOf(digest: string): string {
  return digest.slice(-8);
}
