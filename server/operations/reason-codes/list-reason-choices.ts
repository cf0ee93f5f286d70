import { listActiveReasonCodes } from '@/db/queries/reason-codes';
import type { ReasonChoice } from '@/lib/contracts/reason-code';
import { database } from '@/server/postgres';

/** Reasons that forms let choose from, by word. */
export function listReasonChoices(): Promise<ReasonChoice[]> {
  return listActiveReasonCodes(database());
}
