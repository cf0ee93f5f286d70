import { closeHold, findOpenHold, insertHold } from '@/db/queries/lot-holds';
import { findLotForUpdate, updateLot } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature } from '../signatures/record-signature';

/** Puts a lot on hold: no board of it is tested until it is released. Codes: lot-unknown, lot-held. */
export async function holdLot(actor: Actor, lotId: string, reason: string, at = new Date()): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (lot.heldAt) return refusal('lot-held', `Lot ${lot.code} is on hold already: ${lot.holdReason}`);
    await updateLot(tx, lotId, { heldAt: at, heldBy: actor.accountId, holdReason: reason });
    await insertHold(tx, { lotId, cause: 'person', raisedBy: actor.accountId, raisedAt: at, reason });
    await insertTrail(tx, actor, {
      action: 'lot.held',
      entity: 'lot',
      entityId: lotId,
      after: { code: lot.code },
      reason,
    });
    return done;
  });
}

/** Ends a hold, with the reason for it, signed. Codes: wrong-password, too-many-tries, lot-unknown, lot-not-held. */
export async function releaseLot(
  actor: Actor,
  { lotId, reason, password }: { lotId: string; reason: string; password: string },
  at = new Date(),
): Promise<Outcome> {
  const signed = await confirmSignature(actor, password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    if (!lot.heldAt) return refusal('lot-not-held', `Lot ${lot.code} is not on hold.`);
    const hold = await findOpenHold(tx, lotId);
    const held = { raisedAt: lot.heldAt.toISOString(), holdReason: lot.holdReason };
    const signature = await recordSignature(
      tx,
      actor,
      {
        subject: 'lot-hold',
        subjectId: hold?.id ?? lotId,
        meaning: 'The hold is released: boards of the lot may be tested and certified again.',
        content: { lot: lot.code, ...held, reason },
      },
      at,
    );
    if (hold)
      await closeHold(tx, hold.id, {
        releasedAt: at,
        releasedBy: actor.accountId,
        releaseReason: reason,
        signatureId: signature.id,
      });
    await updateLot(tx, lotId, { heldAt: null, heldBy: null, holdReason: null });
    await insertTrail(tx, actor, {
      action: 'lot.released',
      entity: 'lot',
      entityId: lotId,
      before: held,
      after: { code: lot.code },
      reason,
    });
    return done;
  });
}
