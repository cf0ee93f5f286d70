import type { z } from 'zod';
import { updateRevision } from '@/db/queries/sequence-drafts';
import { findRevisionForUpdate } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { sendBackSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';

/**
 * A submitted revision becomes a draft again: sent back, or taken back by its writer. The reason is shown to the writer. Codes:
 * revision-unknown, not-submitted.
 */
export async function sendBack(
  actor: Actor,
  { revisionId, reason }: z.infer<typeof sendBackSchema>,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
    if (row.status !== 'submitted')
      return refusal('not-submitted', `r${row.number} does not wait for release: it is ${row.status}.`);
    await updateRevision(tx, revisionId, {
      status: 'draft',
      sentBackBy: actor.accountId,
      sentBackAt: at,
      sentBackReason: reason,
    });
    await insertTrail(tx, actor, {
      action: 'sequence.sent-back',
      entity: 'sequence-revision',
      entityId: revisionId,
      after: { revision: `r${row.number}`, version: row.version },
      reason,
    });
    return done;
  });
}
