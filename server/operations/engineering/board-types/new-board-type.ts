import { isUniqueViolation } from '@/db/errors';
import {
  findApprovedRevision,
  findBoardType,
  findStandingBoardTypeDraft,
  insertBoardType,
  insertBoardTypeDraft,
} from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { NewBoardTypeForm } from '@/lib/contracts/board-type-revision';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/**
 * Begins a board type as a draft with all that another one has, but its serials and pictures. Codes: board-type-exists,
 * board-type-unknown.
 */
export async function newBoardType(
  actor: Actor,
  { code, name, copyOfCode }: NewBoardTypeForm,
): Promise<Outcome<{ code: string }>> {
  try {
    return await database().transaction(async (tx) => {
      const model = await findBoardType(tx, copyOfCode);
      const from =
        model && ((await findApprovedRevision(tx, model.id)) ?? (await findStandingBoardTypeDraft(tx, model.id)));
      if (!from) return refusal('board-type-unknown', 'This board type does not exist.', 'copyOfCode');
      const { id } = await insertBoardType(tx, { code, name });
      const { trimmerPhoto: _photo, fixtureDrawing: _drawing, ...copied } = from.specification;
      const serialPattern = copied.serialPattern.replaceAll(copyOfCode, code);
      const draft = await insertBoardTypeDraft(tx, {
        boardTypeId: id,
        specification: { ...copied, code, name, serialPattern },
        madeBy: actor.accountId,
      });
      await insertTrail(tx, actor, {
        action: 'board-type.begun',
        entity: 'board-type-revision',
        entityId: draft.id,
        after: { code, name, copyOf: copyOfCode, number: draft.number },
      });
      return success({ code });
    });
  } catch (error) {
    if (isUniqueViolation(error)) return refusal('board-type-exists', `Board type ${code} exists.`, 'code');
    throw error;
  }
}
