import type { CertificateFacts } from '@/db/queries/certificates';
import { certificateValidity, type CertificateValidity } from '@/lib/certificate/validity';
import type { CertificateRow } from '@/lib/contracts/certificate';

export function validityOf(facts: CertificateFacts): CertificateValidity {
  const { revokedAt, revokedReason, newerAt, testedAgainAt, lotHeldAt, retestOrdered } = facts;
  return certificateValidity({
    revoked: revokedAt && { atIso: revokedAt.toISOString(), reason: revokedReason! },
    newerIso: newerAt?.toISOString() ?? null,
    testedAgainIso: testedAgainAt?.toISOString() ?? null,
    lotHeld: lotHeldAt !== null,
    boardWaits: retestOrdered,
  });
}

export function certificateRow(facts: CertificateFacts): CertificateRow {
  const { id, number, serial, lotCode, boardTypeCode, issuedAt, issuedByName } = facts;
  const issuedIso = issuedAt.toISOString();
  return { id, number, serial, lotCode, boardTypeCode, issuedIso, issuedByName, validity: validityOf(facts) };
}
