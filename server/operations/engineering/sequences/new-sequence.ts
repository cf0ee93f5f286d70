import type { z } from 'zod';
import { isUniqueViolation } from '@/db/errors';
import { listBoardTypesForSequences } from '@/db/queries/sequence-lists';
import { insertDraft, insertSequence } from '@/db/queries/sequence-drafts';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { newSequenceSchema } from '@/lib/contracts/sequence-draft';
import type { Sequence } from '@/lib/sequence/step';
import { database } from '@/server/postgres';
import { firstSteps } from './first-steps';

/** Makes a sequence with its first draft, of the steps given or of the shortest way to a verdict. Codes: board-type-unknown, name-taken. */
export async function newSequence(
  actor: Actor,
  { boardTypeCode, name }: z.infer<typeof newSequenceSchema>,
  steps?: Sequence,
): Promise<Outcome<{ sequenceId: string; revisionId: string }>> {
  try {
    return await database().transaction(async (tx) => {
      const boardType = (await listBoardTypesForSequences(tx)).find(({ code }) => code === boardTypeCode);
      if (!boardType) return refusal('board-type-unknown', `There is no board type ${boardTypeCode}.`, 'boardTypeCode');
      const { id: sequenceId } = await insertSequence(tx, { boardTypeId: boardType.id, name });
      const data = steps ?? firstSteps(boardType.specification);
      const draft = await insertDraft(tx, { sequenceId, data, madeBy: actor.accountId });
      await insertTrail(tx, actor, {
        action: 'sequence.made',
        entity: 'sequence',
        entityId: sequenceId,
        after: { name, boardType: boardTypeCode, draftId: draft.id },
      });
      return success({ sequenceId, revisionId: draft.id });
    });
  } catch (error) {
    if (!isUniqueViolation(error)) throw error;
    return refusal('name-taken', `${boardTypeCode} has a sequence of this name. Choose another.`, 'name');
  }
}
