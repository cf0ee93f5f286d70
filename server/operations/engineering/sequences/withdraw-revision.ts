import type { z } from 'zod';
import { updateRevision } from '@/db/queries/sequence-drafts';
import { findRevisionForUpdate } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { withdrawRevisionSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';
import { confirmSignature } from '../../signatures/confirm-signature';
import { recordSignature } from '../../signatures/record-signature';

const withdrawalMeaning = 'The revision is out of use, in every lot.';

/**
 * Takes a released or superseded revision out of use, signed: no board is begun with it, in any lot. A run under way finishes.
 * Codes: wrong-password, too-many-tries, revision-unknown, not-released.
 */
export async function withdrawRevision(
  actor: Actor,
  { revisionId, reason, password }: z.infer<typeof withdrawRevisionSchema>,
  at = new Date(),
): Promise<Outcome> {
  const signed = await confirmSignature(actor, password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const row = await findRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
    const { number, status } = row;
    if (status !== 'released' && status !== 'superseded')
      return refusal('not-released', `r${number} is ${status}. Only a released revision is withdrawn.`);
    await updateRevision(tx, revisionId, {
      status: 'withdrawn',
      withdrawnBy: actor.accountId,
      withdrawnAt: at,
      withdrawnReason: reason,
    });
    const content = { revision: `r${number}`, reason };
    await recordSignature(
      tx,
      actor,
      { subject: 'sequence-revision', subjectId: revisionId, meaning: withdrawalMeaning, content },
      at,
    );
    await insertTrail(tx, actor, {
      action: 'sequence.withdrawn',
      entity: 'sequence-revision',
      entityId: revisionId,
      before: { status },
      after: { revision: `r${number}`, status: 'withdrawn' },
      reason,
    });
    return done;
  });
}
