import en from '@/lib/messages/en.json';
import type { DispositionKind, LabelState, LotState } from '@/lib/contracts/stored-states';
import type { BoardStanding } from '@/lib/decision/board-standing';
import type { LikelyCause, NoVerdictReason, Verdict } from '@/lib/run/types';

/** What desk pages call things, in English; the bench speaks the operator's language. */

export { quantityWords } from '@/lib/messages/quantity-words';
export { rejectWords } from '@/lib/messages/reject-words';
export const causeWords: Record<LikelyCause, string> = en.cause;
export const noVerdictWords = (reason: NoVerdictReason): string => en.noVerdict[reason].title;

export const verdictWords: Record<Verdict, string> = { pass: 'Passed', reject: 'Rejected', 'no-verdict': 'No verdict' };

export const standingWords: Record<BoardStanding['kind'], string> = {
  'may-be-tested': 'To be tested',
  'in-test': 'In test',
  passed: 'Passed',
  scrapped: 'Scrapped',
  returned: 'Returned',
  'used-as-is': 'Used as is',
  'needs-disposition': 'Needs a decision',
  'waits-for-quality': 'Waits for quality',
  'attempts-used': 'Attempts used',
};

export const lotStateWords: Record<LotState, string> = { open: 'Open', paused: 'Paused', closed: 'Closed' };

export const dispositionWords: Record<DispositionKind, string> = {
  rework: 'Rework',
  scrap: 'Scrap',
  concession: 'Use as is, by concession',
  return: 'Return to the supplier',
};

export const labelWords: Record<LabelState, string> = { waiting: 'waiting', printed: 'printed', failed: 'failed' };
