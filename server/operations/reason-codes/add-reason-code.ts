import { findReasonCodeByWord, insertReasonCode } from '@/db/queries/reason-codes';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { NewReasonCodeForm } from '@/lib/contracts/reason-code';
import { database } from '@/server/postgres';

/** Adds a reason to choose from. A word once retired or merged stays so. Codes: word-taken, word-retired. */
export async function addReasonCode(actor: Actor, { use, word }: NewReasonCodeForm): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const known = await findReasonCodeByWord(tx, use, word);
    if (known)
      return known.retiredAt
        ? refusal('word-retired', 'This reason was retired. Bring it back in the list, or word it otherwise.', 'word')
        : refusal('word-taken', 'This reason is in the list already.', 'word');
    const { id } = await insertReasonCode(tx, { use, word, createdBy: actor.accountId });
    await insertTrail(tx, actor, {
      action: 'reason-code.added',
      entity: 'reason-code',
      entityId: id,
      after: { use, word },
    });
    return done;
  });
}
