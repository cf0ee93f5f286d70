import { findReasonCodeForUpdate, updateMergedInto, updateReasonCode } from '@/db/queries/reason-codes';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { MergeReasonCodeForm } from '@/lib/contracts/reason-code';
import { database } from '@/server/postgres';

/**
 * From now on another reason counts in the place of this one, and of those merged into it before; records keep the word they were
 * signed with. Codes: reason-code-unknown, reason-code-merged, merge-not-possible.
 */
export async function mergeReasonCode(
  actor: Actor,
  { id, intoId }: MergeReasonCodeForm,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    // Locked in one order, so that two merges of the same pair wait for each other.
    const locked = [];
    for (const each of [id, intoId].sort()) locked.push(await findReasonCodeForUpdate(tx, each));
    const code = locked.find((each) => each?.id === id);
    const into = locked.find((each) => each?.id === intoId);
    if (!code || !into) return refusal('reason-code-unknown', 'This reason does not exist.');
    if (code.mergedIntoId) return refusal('reason-code-merged', 'This reason was merged already.');
    if (id === intoId || into.use !== code.use || into.retiredAt)
      return refusal('merge-not-possible', 'Choose another reason of the same kind that is still in use.', 'intoId');
    await updateReasonCode(tx, id, { retiredAt: code.retiredAt ?? at, mergedIntoId: intoId });
    await updateMergedInto(tx, id, intoId);
    await insertTrail(tx, actor, {
      action: 'reason-code.merged',
      entity: 'reason-code',
      entityId: id,
      before: { use: code.use, word: code.word },
      after: { mergedIntoId: intoId, word: into.word },
    });
    return done;
  });
}
