import type { z } from 'zod';
import { findBoardTypeRevisionForUpdate, updateBoardTypeRevision } from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { discardBoardTypeDraftSchema } from '@/lib/contracts/board-type-revision';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Ends a draft; it stays in the history under its number. Codes: revision-unknown, not-a-draft. */
export async function discardBoardTypeDraft(
  actor: Actor,
  { revisionId, reason }: z.infer<typeof discardBoardTypeDraftSchema>,
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findBoardTypeRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This draft does not exist. Load the page again.');
    if (row.status !== 'draft')
      return refusal('not-a-draft', `Revision ${row.number} is ${row.status}. Only a draft is discarded.`);
    await updateBoardTypeRevision(tx, row.id, { status: 'withdrawn' });
    await insertTrail(tx, actor, {
      action: 'board-type.draft-discarded',
      entity: 'board-type-revision',
      entityId: row.id,
      before: { number: row.number, version: row.version, specification: row.specification },
      reason,
    });
    return done;
  });
}
