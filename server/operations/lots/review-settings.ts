import type { Database } from '@/db/client';
import { findSiteSetting } from '@/db/queries/site-settings';
import { operatorNamingKey, operatorNamingSchema } from '@/lib/contracts/operator-naming';
import type { ShiftClock } from '@/lib/quality/comparison-factors';

export interface ReviewSettings extends ShiftClock {
  /** Whether operators are told by their number; else they are letters. */
  operatorsShown: boolean;
}

/** What of the site's settings a review needs. */
export async function readReviewSettings(db: Database): Promise<ReviewSettings> {
  const naming = operatorNamingSchema.safeParse(await findSiteSetting(db, operatorNamingKey));
  return {
    timeZone: 'UTC',
    shiftStarts: ['06:00', '14:00', '22:00'],
    operatorsShown: naming.success && naming.data.shown,
  };
}
