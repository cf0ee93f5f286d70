/** Whether a certificate still counts. Times are ISO. */
export type CertificateValidity =
  | { kind: 'valid' }
  | { kind: 'revoked'; atIso: string; reason: string }
  | { kind: 'replaced'; because: 'newer-certificate' | 'tested-again'; atIso: string }
  | { kind: 'under-review'; because: 'lot-held' | 'board-waits' };

/** What happened since it was issued; null or false: nothing. */
export interface CertificateFate {
  revoked: { atIso: string; reason: string } | null;
  /** A newer certificate of the same board or lot. */
  newerIso: string | null;
  /** A board it covers was tested again, with a verdict. */
  testedAgainIso: string | null;
  lotHeld: boolean;
  /** A board it covers is in test again, or waits for a test or a decision. */
  boardWaits: boolean;
}

/** What ends it for good is said before what may pass. */
export function certificateValidity(fate: CertificateFate): CertificateValidity {
  if (fate.revoked) return { kind: 'revoked', ...fate.revoked };
  if (fate.newerIso) return { kind: 'replaced', because: 'newer-certificate', atIso: fate.newerIso };
  if (fate.testedAgainIso) return { kind: 'replaced', because: 'tested-again', atIso: fate.testedAgainIso };
  if (fate.lotHeld) return { kind: 'under-review', because: 'lot-held' };
  return fate.boardWaits ? { kind: 'under-review', because: 'board-waits' } : { kind: 'valid' };
}
