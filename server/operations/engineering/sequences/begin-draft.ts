import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import { isUniqueViolation } from '@/db/errors';
import { insertTrail } from '@/db/queries/trail';
import { insertDraft } from '@/db/queries/sequence-drafts';
import { findStandingDraft, listNames, listRevisions } from '@/db/queries/sequence-revisions';
import type { Actor } from '@/lib/access/actor';
import { refusal, success, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import type { beginDraftSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';

/**
 * Begins a draft with the steps of an earlier revision, or of the one in use, or of the newest where none is. Codes:
 * sequence-unknown, revision-unknown, draft-exists.
 */
export async function beginDraft(
  actor: Actor,
  { sequenceId, fromRevisionId }: z.infer<typeof beginDraftSchema>,
): Promise<Outcome<{ revisionId: string; number: number }>> {
  try {
    return await database().transaction(async (tx) => {
      const revisions = await listRevisions(tx, sequenceId);
      const inUse = revisions.find(({ status }) => status === 'released') ?? revisions[0];
      if (!inUse) return refusal('sequence-unknown', 'This sequence does not exist.');
      const from = fromRevisionId ? revisions.find(({ id }) => id === fromRevisionId) : inUse;
      if (!from) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
      const standing = await draftStands(tx, sequenceId);
      if (standing) return standing;
      const draft = await insertDraft(tx, {
        sequenceId,
        data: from.data,
        madeBy: actor.accountId,
        basedOnId: from.id,
      });
      await insertTrail(tx, actor, {
        action: from === inUse ? 'sequence.draft-begun' : 'sequence.draft-restored',
        entity: 'sequence-revision',
        entityId: draft.id,
        after: { sequenceId, number: draft.number, basedOn: `r${from.number}` },
      });
      return success({ revisionId: draft.id, number: draft.number });
    });
  } catch (error) {
    if (!isUniqueViolation(error, 'sequence_revisions_one_draft')) throw error;
    return refusal('draft-exists', 'Somebody began a draft a moment ago. Load the page again.');
  }
}

/** A sequence has one draft at a time; null when it has none. */
export async function draftStands(tx: Transaction, sequenceId: string): Promise<Refusal | null> {
  const standing = await findStandingDraft(tx, sequenceId);
  if (!standing) return null;
  const name = (await listNames(tx, [standing.madeBy])).get(standing.madeBy) ?? '';
  return refusal(
    'draft-exists',
    standing.status === 'draft'
      ? `r${standing.number} by ${name} is a draft already. Open it, or discard it first.`
      : `r${standing.number} by ${name} waits for release. Release it or send it back first.`,
  );
}
