import type { z } from 'zod';
import {
  findApprovedRevision,
  findBoardTypeRevisionForUpdate,
  updateBoardTypeRevision,
} from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { checkBoardType } from '@/lib/board-type/check-board-type';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import type { askApprovalSchema } from '@/lib/contracts/board-type-revision';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/**
 * Asks quality to approve the saved draft. Codes: revision-unknown, not-a-draft, draft-changed, has-errors, nothing-changed.
 */
export async function askApproval(
  actor: Actor,
  { revisionId, version, note }: z.infer<typeof askApprovalSchema>,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findBoardTypeRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This draft does not exist. Load the page again.');
    if (row.status !== 'draft')
      return refusal('not-a-draft', `Revision ${row.number} is ${row.status} already. Load the page again.`);
    if (row.version !== version)
      return refusal('draft-changed', 'Somebody saved this draft meanwhile. Look at it again, then ask.');
    const errors = checkBoardType(row.specification).filter(({ severity }) => severity === 'error');
    if (errors.length > 0) return refusal('has-errors', errors[0]!.sentence);
    const inUse = await findApprovedRevision(tx, row.boardTypeId);
    const changes = inUse && compareBoardTypes(inUse.specification, row.specification);
    if (changes?.length === 0)
      return refusal('nothing-changed', `Nothing differs from revision ${inUse!.number}, which is in use.`);
    await updateBoardTypeRevision(tx, row.id, {
      status: 'submitted',
      note,
      submittedBy: actor.accountId,
      submittedAt: at,
      editedBy: [...new Set([...row.editedBy, actor.accountId])],
      sentBackBy: null,
      sentBackAt: null,
      sentBackReason: null,
    });
    await insertTrail(tx, actor, {
      action: 'board-type.approval-asked',
      entity: 'board-type-revision',
      entityId: row.id,
      before: inUse && { number: inUse.number },
      after: { number: row.number, version, changes },
      reason: note,
    });
    return done;
  });
}
