import type { z } from 'zod';
import { findLotForUpdate, updateLot } from '@/db/queries/lots';
import { insertLotMove } from '@/db/queries/lot-moves';
import { findOpenRunOfLot } from '@/db/queries/lots-runs';
import { findRevision } from '@/db/queries/sequence-revisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { moveLotSchema } from '@/lib/contracts/sequence-draft';
import { database } from '@/server/postgres';

/**
 * Moves a lot that is not closed to the newer revision in use of its sequence, from the next board on; runs before keep theirs.
 * Codes: lot-unknown, lot-closed, revision-unknown, revision-not-newer, revision-not-released, lot-in-test.
 */
export async function moveLot(
  actor: Actor,
  { lotId, toRevisionId, reason }: z.infer<typeof moveLotSchema>,
): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (lot.state === 'closed') return refusal('lot-closed', `Lot ${lot.code} is closed. Open it again first.`);
    const [from, to] = await Promise.all([findRevision(tx, lot.sequenceRevisionId), findRevision(tx, toRevisionId)]);
    if (!to || !from || to.sequenceId !== from.sequenceId)
      return refusal('revision-unknown', 'This revision belongs to another sequence. Choose again.');
    if (to.number <= from.number)
      return refusal('revision-not-newer', `Lot ${lot.code} has r${from.number} already. Load the page again.`);
    if (to.status !== 'released')
      return refusal('revision-not-released', `r${to.number} is ${to.status}. A lot takes only the one in use.`);
    const run = await findOpenRunOfLot(tx, lotId);
    if (run)
      return refusal(
        'lot-in-test',
        `Board ${run.serial} is in test at station ${run.stationCode}. Move the lot when it is done.`,
      );
    await updateLot(tx, lotId, { sequenceRevisionId: to.id });
    await insertLotMove(tx, {
      lotId,
      fromRevisionId: from.id,
      toRevisionId: to.id,
      reason,
      movedBy: actor.accountId,
    });
    await insertTrail(tx, actor, {
      action: 'lot.moved',
      entity: 'lot',
      entityId: lotId,
      before: { sequence: `r${from.number}`, sequenceRevisionId: from.id },
      after: { sequence: `r${to.number}`, sequenceRevisionId: to.id },
      reason,
    });
    return done;
  });
}
