import type { ReasonCodeUse } from '@/lib/contracts/stored-states';

/** What a reason is for. */
export const reasonUseWords: Record<ReasonCodeUse, string> = {
  rework: 'Rework',
  scrap: 'Scrap',
  concession: 'Concession',
  return: 'Return to the supplier',
  hold: 'Hold of a lot',
  'hold-release': 'Release of a hold',
};
