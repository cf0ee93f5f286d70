import { findUnitForUpdate, insertRetestOrder } from '@/db/queries/units-decisions';
import { insertTrail } from '@/db/queries/trail';
import { findUnitRecord } from '@/db/queries/unit-records';
import type { Actor } from '@/lib/access/actor';
import type { RetestOrderForm } from '@/lib/contracts/disposition';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { boardStanding } from '@/lib/decision/board-standing';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature } from '../signatures/record-signature';

/**
 * Quality orders one more run of a board that passed or waits; its verdict replaces the one before. Codes: unit-unknown,
 * retest-not-possible, wrong-password, too-many-tries.
 */
export async function orderRetest(actor: Actor, form: RetestOrderForm, at = new Date()): Promise<Outcome> {
  const signed = await confirmSignature(actor, form.password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const unit = await findUnitForUpdate(tx, form.unitId);
    const record = unit && (await findUnitRecord(tx, unit.id));
    if (!unit || !record) return refusal('unit-unknown', 'This board does not exist.');
    const { kind } = boardStanding(record);
    if (kind !== 'passed' && kind !== 'waits-for-quality')
      return refusal(
        'retest-not-possible',
        kind === 'may-be-tested'
          ? 'This board may be tested already.'
          : kind === 'needs-disposition'
            ? 'This board was rejected. Record a rework instead.'
            : 'Only a board that passed or waits for quality is tested again.',
      );
    const { id } = await insertRetestOrder(tx, {
      unitId: unit.id,
      reason: form.reason,
      signedBy: actor.accountId,
      signedAt: at,
    });
    await recordSignature(
      tx,
      actor,
      {
        subject: 'retest-order',
        subjectId: id,
        meaning: 'The board is tested once more; the new result replaces the old one.',
        content: { serial: unit.serial, reason: form.reason },
      },
      at,
    );
    await insertTrail(tx, actor, {
      action: 'unit.retest-ordered',
      entity: 'unit',
      entityId: unit.id,
      after: { retestOrderId: id, serial: unit.serial },
      reason: form.reason,
    });
    return done;
  });
}
