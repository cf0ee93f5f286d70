import type { Database } from '@/db/client';
import type { ShiftClock } from '@/lib/quality/comparison-factors';

export interface ReviewSettings extends ShiftClock {
  /** Whether operators are told by their number; else they are letters. */
  operatorsShown: boolean;
}

/** What of the site's settings a review needs. */
export async function readReviewSettings(_db: Database): Promise<ReviewSettings> {
  return { timeZone: 'UTC', shiftStarts: ['06:00', '14:00', '22:00'], operatorsShown: false };
}
