import { findLotForUpdate } from '@/db/queries/lots';
import { insertComponentBatch } from '@/db/queries/lots-components';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { ComponentBatchForm } from '@/lib/contracts/lot';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** From now on boards of the lot carry this batch; entered at a desk or at a bench. Codes: lot-unknown, lot-closed. */
export async function recordComponentBatch(actor: Actor, input: ComponentBatchForm): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, input.lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (lot.state === 'closed') return refusal('lot-closed', `Lot ${lot.code} is closed. Open it first.`);
    await insertComponentBatch(tx, { ...input, byAccountId: actor.accountId, stationId: actor.stationId });
    await insertTrail(tx, actor, {
      action: 'lot.component-batch',
      entity: 'lot',
      entityId: input.lotId,
      after: { component: input.component, batch: input.batch },
    });
    return done;
  });
}
