import type { VerdictShape } from '@/components/ui/verdict-mark';
import { dayWords } from '@/lib/certificate/certificate-words';
import type { CertificateValidity } from '@/lib/certificate/validity';

interface Said {
  shape: VerdictShape;
  title: string;
  /** Empty: it is valid. */
  words: string;
}

/** What whoever holds the paper is told first. */
export function validitySaid(validity: CertificateValidity, kind: 'board' | 'lot', timeZone: string): Said {
  const day = (iso: string) => dayWords(iso, timeZone);
  switch (validity.kind) {
    case 'valid':
      return { shape: 'pass', title: 'This certificate is genuine', words: '' };
    case 'revoked':
      return {
        shape: 'reject',
        title: 'This certificate is revoked',
        words: `The maker revoked it on ${day(validity.atIso)}: ${validity.reason}`,
      };
    case 'replaced':
      return {
        shape: 'check',
        title: 'This certificate is replaced',
        words:
          validity.because === 'newer-certificate'
            ? `The maker issued a newer one on ${day(validity.atIso)}. Ask for that paper.`
            : `${kind === 'board' ? 'The board was' : 'A board of the lot was'} tested again on ${day(validity.atIso)}. Ask the maker for its newest certificate.`,
      };
    case 'under-review':
      return {
        shape: 'hold',
        title: 'This certificate is under review',
        words:
          validity.because === 'lot-held'
            ? 'The maker holds the lot back at present. Check this paper again before you use a board.'
            : 'The maker wants a board tested again. Check this paper again before you use a board.',
      };
  }
}
