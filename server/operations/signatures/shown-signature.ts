import type { Signature } from '@/db/queries/signatures';
import type { UnitSignature } from '@/lib/contracts/unit-page';
import { signatureHolds } from './record-signature';

/** A signature as pages show it, and whether it still fits what it is kept with. */
export function shownSignature(signature: Signature): UnitSignature {
  const { accountId, name, signedAt, meaning, digest, content } = signature;
  const shown = content as Partial<Pick<UnitSignature, 'sides' | 'serials' | 'rejectReason'>>;
  return {
    accountId,
    name,
    signedIso: signedAt.toISOString(),
    meaning,
    digest,
    holds: signatureHolds(signature),
    sides: shown.sides ?? [],
    serials: shown.serials ?? [],
    rejectReason: shown.rejectReason ?? null,
  };
}
