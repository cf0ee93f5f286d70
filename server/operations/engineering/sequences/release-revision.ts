import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import { updateRevision } from '@/db/queries/sequence-drafts';
import { findReleased, findRevisionForUpdate, type SequenceRevision } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome, type Refusal } from '@/lib/contracts/outcome';
import { releaseMeanings, type releaseRevisionSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';
import { confirmSignature } from '../../signatures/confirm-signature';
import { recordSignature } from '../../signatures/record-signature';
import { mayRelease } from './may-release';
import { releaseBlock } from './release-blocks';

/**
 * Signs the release of a submitted revision, as it was seen; the one in use is superseded with it. Nobody releases what they made,
 * changed or submitted. Codes: wrong-password, too-many-tries, revision-unknown, not-submitted, draft-changed, not-yours-to-release,
 * sequence-has-errors, warning-needs-reason.
 */
export async function releaseRevision(
  actor: Actor,
  { revisionId, version, meaning, password }: z.infer<typeof releaseRevisionSchema>,
  at = new Date(),
): Promise<Outcome> {
  const signed = await confirmSignature(actor, password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const row = await findRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
    const refused = refuse(actor, row, version) ?? (await releaseBlock(tx, row));
    if (refused) return refused;
    const superseded = await supersede(tx, actor, row.sequenceId, at);
    const { words } = releaseMeanings.find(({ key }) => key === meaning)!;
    await updateRevision(tx, revisionId, {
      status: 'released',
      releasedBy: actor.accountId,
      releasedAt: at,
      releaseMeaning: words,
    });
    const content = { revision: `r${row.number}`, version, note: row.note, sequence: row.data };
    await recordSignature(
      tx,
      actor,
      { subject: 'sequence-revision', subjectId: revisionId, meaning: words, content },
      at,
    );
    await insertTrail(tx, actor, {
      action: 'sequence.released',
      entity: 'sequence-revision',
      entityId: revisionId,
      before: superseded && { revision: `r${superseded.number}` },
      after: { ...content, meaning: words },
    });
    return done;
  });
}

function refuse(actor: Actor, row: SequenceRevision, version: number): Refusal | null {
  const { number, status } = row;
  if (status !== 'submitted') return refusal('not-submitted', `r${number} does not wait for release: it is ${status}.`);
  if (row.version !== version)
    return refusal('draft-changed', `r${number} was changed since you opened it. Compare it again, then sign.`);
  if (!mayRelease(actor, row))
    return refusal('not-yours-to-release', `You wrote a part of r${number}. Another engineer or quality releases it.`);
  return null;
}

/** The revision in use until now, which lots that pin it go on with; null: none was. */
async function supersede(
  tx: Transaction,
  actor: Actor,
  sequenceId: string,
  at: Date,
): Promise<SequenceRevision | null> {
  const inUse = await findReleased(tx, sequenceId);
  if (!inUse) return null;
  await updateRevision(tx, inUse.id, { status: 'superseded', supersededAt: at });
  await insertTrail(tx, actor, {
    action: 'sequence.superseded',
    entity: 'sequence-revision',
    entityId: inUse.id,
    after: { revision: `r${inUse.number}` },
  });
  return inUse;
}
