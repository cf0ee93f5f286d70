import type { Signature } from '@/db/queries/signatures';
import type { UnitSignature } from '@/lib/contracts/unit-page';
import { signatureHolds } from './record-signature';

/** A signature as pages show it, and whether it still fits what it is kept with. */
export function shownSignature(signature: Signature): UnitSignature {
  const { accountId, name, signedAt, meaning, digest, content } = signature;
  const { sides = [], serials = [] } = content as Partial<Pick<UnitSignature, 'sides' | 'serials'>>;
  const signedIso = signedAt.toISOString();
  return { accountId, name, signedIso, meaning, digest, holds: signatureHolds(signature), sides, serials };
}
