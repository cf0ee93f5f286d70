import { listReasonCodes } from '@/db/queries/reason-codes';
import type { ReasonCodeRow } from '@/lib/contracts/reason-code';
import { database } from '@/server/postgres';

/** Every reason, those that are not used any more among them, by what they are for and by word. */
export async function listReasonCodeRows(): Promise<ReasonCodeRow[]> {
  const rows = await listReasonCodes(database());
  return rows.map(({ code: { id, use, word, createdAt, retiredAt }, ...row }) => ({
    ...row,
    id,
    use,
    word,
    createdIso: createdAt.toISOString(),
    retiredIso: retiredAt?.toISOString() ?? null,
  }));
}
