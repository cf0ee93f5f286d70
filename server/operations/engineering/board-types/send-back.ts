import type { z } from 'zod';
import type { Transaction } from '@/db/client';
import {
  findBoardTypeRevisionForUpdate,
  updateBoardTypeRevision,
  type BoardTypeRevision,
} from '@/db/queries/board-type-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { sendBackLimitsSchema, takeBackSchema } from '@/lib/contracts/board-type-revision';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Quality sends back what waits, with what to change. Codes: revision-unknown, not-waiting, draft-changed. */
export async function sendBackLimits(
  actor: Actor,
  { revisionId, version, reason }: z.infer<typeof sendBackLimitsSchema>,
  at = new Date(),
): Promise<Outcome> {
  return asDraftAgain(revisionId, async (tx, row) => {
    if (row.version !== version)
      return refusal('draft-changed', 'It was changed since you opened it. Look at it again.');
    await updateBoardTypeRevision(tx, row.id, {
      status: 'draft',
      sentBackBy: actor.accountId,
      sentBackAt: at,
      sentBackReason: reason,
    });
    await insertTrail(tx, actor, {
      action: 'board-type.sent-back',
      entity: 'board-type-revision',
      entityId: row.id,
      after: { number: row.number },
      reason,
    });
    return done;
  });
}

/** An engineer takes back what waits, to change it. Codes: revision-unknown, not-waiting. */
export async function takeBack(actor: Actor, { revisionId }: z.infer<typeof takeBackSchema>): Promise<Outcome> {
  return asDraftAgain(revisionId, async (tx, row) => {
    await updateBoardTypeRevision(tx, row.id, { status: 'draft', submittedBy: null, submittedAt: null });
    await insertTrail(tx, actor, {
      action: 'board-type.taken-back',
      entity: 'board-type-revision',
      entityId: row.id,
      after: { number: row.number },
    });
    return done;
  });
}

async function asDraftAgain(
  revisionId: string,
  change: (tx: Transaction, row: BoardTypeRevision) => Promise<Outcome>,
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const row = await findBoardTypeRevisionForUpdate(tx, revisionId);
    if (!row) return refusal('revision-unknown', 'This revision does not exist. Load the page again.');
    if (row.status !== 'submitted')
      return refusal('not-waiting', `Revision ${row.number} does not wait for approval: it is ${row.status}.`);
    return change(tx, row);
  });
}
