import type { z } from 'zod';
import { updateRevision } from '@/db/queries/sequence-drafts';
import { findReleased, findRevisionForUpdate } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { submitRevisionSchema } from '@/lib/contracts/sequence-draft';
import { changeSentences } from '@/lib/sequence/change-sentences';
import { compareSequences } from '@/lib/sequence/compare-sequences';
import { database } from '@/server/postgres';
import { releaseBlock, standingReasons } from './release-blocks';

/**
 * Asks for the release of a draft, as it was seen. Codes: revision-unknown, not-a-draft, draft-changed, nothing-changed,
 * sequence-has-errors, warning-needs-reason.
 */
export async function submitRevision(
  actor: Actor,
  { revisionId, version, note }: z.infer<typeof submitRevisionSchema>,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This draft does not exist. Load the page again.');
    const { number, status, sequenceId } = row;
    if (status !== 'draft') return refusal('not-a-draft', `r${number} is ${status} already. Load the page again.`);
    if (row.version !== version)
      return refusal('draft-changed', 'Somebody saved the draft meanwhile. Look at it again, then submit.');
    const inUse = await findReleased(tx, sequenceId);
    const comparison = inUse && compareSequences(inUse.data, row.data);
    if (comparison?.same)
      return refusal('nothing-changed', `Nothing differs from r${inUse!.number}, which is in use. Change it first.`);
    const blocked = await releaseBlock(tx, row);
    if (blocked) return blocked;
    const warningReasons = await standingReasons(tx, row);
    await updateRevision(tx, revisionId, {
      status: 'submitted',
      note,
      warningReasons,
      submittedBy: actor.accountId,
      submittedAt: at,
      sentBackBy: null,
      sentBackAt: null,
      sentBackReason: null,
    });
    await insertTrail(tx, actor, {
      action: 'sequence.submitted',
      entity: 'sequence-revision',
      entityId: revisionId,
      before: inUse && { revision: `r${inUse.number}` },
      after: {
        revision: `r${number}`,
        version,
        changes: comparison ? changeSentences(comparison) : [],
        warningReasons,
        sequence: row.data,
      },
      reason: note,
    });
    return done;
  });
}
