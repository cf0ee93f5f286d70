import { findReasonCodeForUpdate, updateReasonCode } from '@/db/queries/reason-codes';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/**
 * Forms offer the reason no more, or again; records keep its word either way. One that was merged is not brought back. Codes:
 * reason-code-unknown, reason-code-merged.
 */
export async function retireReasonCode(actor: Actor, id: string, retired: boolean, at = new Date()): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const code = await findReasonCodeForUpdate(tx, id);
    if (!code) return refusal('reason-code-unknown', 'This reason does not exist.');
    if (code.mergedIntoId) return refusal('reason-code-merged', 'This reason was merged into another one.');
    if ((code.retiredAt !== null) === retired) return done;
    await updateReasonCode(tx, id, { retiredAt: retired ? at : null });
    await insertTrail(tx, actor, {
      action: retired ? 'reason-code.retired' : 'reason-code.brought-back',
      entity: 'reason-code',
      entityId: id,
      after: { use: code.use, word: code.word },
    });
    return done;
  });
}
