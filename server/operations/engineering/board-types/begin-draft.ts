import { isUniqueViolation } from '@/db/errors';
import { findBoardType, insertBoardTypeDraft, listBoardTypeRevisions } from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Begins a draft from the approved revision, or from the newest where none is. Codes: board-type-unknown, draft-exists. */
export async function beginBoardTypeDraft(
  actor: Actor,
  { code }: { code: string },
): Promise<Outcome<{ revisionId: string; number: number }>> {
  const stands = refusal('draft-exists', 'Somebody began a draft already. Load the page again.');
  try {
    return await database().transaction(async (tx) => {
      const type = await findBoardType(tx, code);
      const revisions = type ? (await listBoardTypeRevisions(tx, type.id)).map(({ revision }) => revision) : [];
      const from = revisions.find(({ status }) => status === 'approved') ?? revisions[0];
      if (!type || !from) return refusal('board-type-unknown', 'This board type does not exist.');
      if (revisions.some(({ status }) => status === 'draft' || status === 'submitted')) return stands;
      const draft = await insertBoardTypeDraft(tx, {
        boardTypeId: type.id,
        specification: from.specification,
        madeBy: actor.accountId,
      });
      await insertTrail(tx, actor, {
        action: 'board-type.draft-begun',
        entity: 'board-type-revision',
        entityId: draft.id,
        after: { code, number: draft.number, from: from.number },
      });
      return success({ revisionId: draft.id, number: draft.number });
    });
  } catch (error) {
    if (isUniqueViolation(error)) return stands;
    throw error;
  }
}
