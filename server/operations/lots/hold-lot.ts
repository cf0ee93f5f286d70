import { findLotForUpdate, updateLot } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

/** Puts a lot on hold: no board of it is tested until it is released. Codes: lot-unknown, lot-held. */
export async function holdLot(actor: Actor, lotId: string, reason: string): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (lot.heldAt) return refusal('lot-held', `Lot ${lot.code} is on hold already: ${lot.holdReason}`);
    await updateLot(tx, lotId, { heldAt: new Date(), heldBy: actor.accountId, holdReason: reason });
    await insertTrail(tx, actor, { action: 'lot.held', entity: 'lot', entityId: lotId, reason });
    return done;
  });
}

/** Ends a hold, with the reason for it. Codes: lot-unknown, lot-not-held. */
export async function releaseLot(actor: Actor, lotId: string, reason: string): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (!lot.heldAt) return refusal('lot-not-held', `Lot ${lot.code} is not on hold.`);
    await updateLot(tx, lotId, { heldAt: null, heldBy: null, holdReason: null });
    await insertTrail(tx, actor, {
      action: 'lot.released',
      entity: 'lot',
      entityId: lotId,
      before: { heldAt: lot.heldAt.toISOString(), holdReason: lot.holdReason },
      reason,
    });
    return done;
  });
}
