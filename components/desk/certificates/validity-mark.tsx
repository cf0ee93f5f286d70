import { VerdictMark, type VerdictShape } from '@/components/ui/verdict-mark';
import type { CertificateValidity } from '@/lib/certificate/validity';

const look: Record<CertificateValidity['kind'], { shape: VerdictShape; word: string }> = {
  valid: { shape: 'pass', word: 'Valid' },
  revoked: { shape: 'reject', word: 'Revoked' },
  replaced: { shape: 'check', word: 'Replaced' },
  'under-review': { shape: 'hold', word: 'Under review' },
};

/** Whether a certificate counts, with why not. */
export function ValidityMark({ validity }: { validity: CertificateValidity }) {
  const { shape, word } = look[validity.kind];
  return (
    <span>
      <VerdictMark shape={shape} size={16} /> <b>{word}</b>
      {why(validity)}
    </span>
  );
}

function why(validity: CertificateValidity): string {
  if (validity.kind === 'revoked') return `: ${validity.reason}`;
  if (validity.kind === 'replaced')
    return validity.because === 'newer-certificate' ? ' by a newer one' : ', tested again since';
  if (validity.kind === 'under-review')
    return validity.because === 'lot-held' ? ', the lot is on hold' : ', a retest is ordered';
  return '';
}
