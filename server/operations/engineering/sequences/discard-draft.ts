import type { z } from 'zod';
import { endOpenOffersOf } from '@/db/queries/engineering-offers';
import { updateRevision } from '@/db/queries/sequence-drafts';
import { findRevisionForUpdate } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { discardDraftSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';

/**
 * Ends a draft without a release. It stays in the history with its steps, number, dry runs and trials, so a discarded one can be
 * begun from again; offers of it end. Codes: revision-unknown, not-a-draft.
 */
export async function discardDraft(
  actor: Actor,
  { revisionId, reason }: z.infer<typeof discardDraftSchema>,
  at = new Date(),
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This draft does not exist. Load the page again.');
    const { number, status } = row;
    if (status !== 'draft')
      return refusal(
        'not-a-draft',
        status === 'submitted'
          ? `r${number} waits for release. Take it back first.`
          : `r${number} is ${status} and stays. Load the page again.`,
      );
    await endOpenOffersOf(tx, revisionId, { accountId: actor.accountId, at });
    await updateRevision(tx, revisionId, {
      status: 'withdrawn',
      withdrawnBy: actor.accountId,
      withdrawnAt: at,
      withdrawnReason: reason,
    });
    await insertTrail(tx, actor, {
      action: 'sequence.draft-discarded',
      entity: 'sequence-revision',
      entityId: revisionId,
      after: { revision: `r${number}`, version: row.version },
      reason,
    });
    return done;
  });
}
