import type { z } from 'zod';
import {
  findApprovedRevision,
  findBoardTypeRevisionForUpdate,
  updateBoardTypeName,
  updateBoardTypeRevision,
  type BoardTypeRevision,
} from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import { mayApprove, type Actor } from '@/lib/access/actor';
import { checkBoardType } from '@/lib/board-type/check-board-type';
import { compareBoardTypes } from '@/lib/board-type/compare-board-types';
import { approvalMeanings, type approveLimitsSchema } from '@/lib/contracts/board-type-revision';
import { done, refusal, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { confirmSignature } from '../../signatures/confirm-signature';
import { recordSignature } from '../../signatures/record-signature';

/** Whoever made, changed or asked for a revision: none of them approves it. */
export const makersOf = ({ madeBy, editedBy, submittedBy }: BoardTypeRevision) => [
  madeBy,
  ...editedBy,
  ...(submittedBy ? [submittedBy] : []),
];

/**
 * Quality signs what waits, as it was seen. It takes the place of the revision in use; lots that are open keep theirs. Codes:
 * wrong-password, too-many-tries, revision-unknown, not-waiting, draft-changed, own-change, has-errors.
 */
export async function approveLimits(
  actor: Actor,
  { revisionId, version, meaning, password }: z.infer<typeof approveLimitsSchema>,
  at = new Date(),
): Promise<Outcome> {
  const signed = await confirmSignature(actor, password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const row = await findBoardTypeRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
    const refused = refuse(actor, row, version);
    if (refused) return refused;
    const before = await findApprovedRevision(tx, row.boardTypeId);
    if (before) await updateBoardTypeRevision(tx, before.id, { status: 'superseded', supersededAt: at });
    await updateBoardTypeRevision(tx, row.id, { status: 'approved', approvedBy: actor.accountId, approvedAt: at });
    await updateBoardTypeName(tx, row.boardTypeId, row.specification.name);
    const { words } = approvalMeanings.find(({ key }) => key === meaning)!;
    const content = { number: row.number, version, note: row.note, specification: row.specification };
    const bound = { subject: 'board-type-revision', subjectId: row.id, meaning: words, content };
    await recordSignature(tx, actor, bound, at);
    await insertTrail(tx, actor, {
      action: 'board-type.approved',
      entity: 'board-type-revision',
      entityId: row.id,
      before: before && { number: before.number, limits: before.specification.limits },
      after: {
        number: row.number,
        version,
        limits: row.specification.limits,
        changes: before && compareBoardTypes(before.specification, row.specification),
        meaning: words,
      },
      reason: row.note,
    });
    return done;
  });
}

function refuse(actor: Actor, row: BoardTypeRevision, version: number): Refusal | null {
  if (row.status !== 'submitted')
    return refusal('not-waiting', `Revision ${row.number} does not wait for approval: it is ${row.status}.`);
  if (row.version !== version)
    return refusal('draft-changed', 'It was changed since you opened it. Look at it again, then sign.');
  if (!mayApprove(actor, 'approve-limits', makersOf(row)))
    return refusal('own-change', 'You wrote a part of it. Somebody else in quality approves it.');
  const error = checkBoardType(row.specification).find(({ severity }) => severity === 'error');
  return error ? refusal('has-errors', error.sentence) : null;
}
