import { randomUUID } from 'node:crypto';
import { findUnitForUpdate, insertDisposition, markScrapped } from '@/db/queries/units-decisions';
import { insertTrail } from '@/db/queries/trail';
import { findUnitRecord } from '@/db/queries/unit-records';
import type { Actor } from '@/lib/access/actor';
import type { DispositionForm } from '@/lib/contracts/disposition';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { boardStanding } from '@/lib/decision/board-standing';
import { database } from '@/server/postgres';
import { confirmSignature } from '../signatures/confirm-signature';
import { recordSignature } from '../signatures/record-signature';

const meaningOf: Record<DispositionForm['kind'], string> = {
  rework: 'The board is reworked as said, then tested once more.',
  scrap: 'The board is scrapped and leaves the lot.',
};

/**
 * What is done with a board that was rejected or waits for quality, signed. Rework lets it be tested again while attempts
 * are left; scrap ends it. Codes: unit-unknown, nothing-to-decide, attempts-used, wrong-password, too-many-tries.
 */
export async function signDisposition(actor: Actor, form: DispositionForm, at = new Date()): Promise<Outcome> {
  const signed = await confirmSignature(actor, form.password);
  if (!signed.ok) return signed;
  return database().transaction(async (tx) => {
    const unit = await findUnitForUpdate(tx, form.unitId);
    const record = unit && (await findUnitRecord(tx, unit.id));
    if (!unit || !record) return refusal('unit-unknown', 'This board does not exist.');
    const standing = boardStanding(record);
    const run = record.runs.at(-1);
    const scrapsUsedUp = form.kind === 'scrap' && standing.kind === 'attempts-used';
    if (!run || !(standing.kind === 'needs-disposition' || standing.kind === 'waits-for-quality' || scrapsUsedUp))
      return standing.kind === 'attempts-used'
        ? refusal('attempts-used', `All ${standing.most} attempts are used. Scrap the board.`, 'kind')
        : refusal('nothing-to-decide', 'This board needs no decision now. Load the page again.');
    const action = form.kind === 'rework' ? form.action : '';
    const content = { kind: form.kind, serial: unit.serial, runId: run.id, action, reason: form.reason };
    const id = randomUUID();
    const signature = await recordSignature(
      tx,
      actor,
      { subject: 'disposition', subjectId: id, meaning: meaningOf[form.kind], content },
      at,
    );
    await insertDisposition(tx, {
      id,
      unitId: unit.id,
      runId: run.id,
      kind: form.kind,
      action,
      reason: form.reason,
      signedBy: actor.accountId,
      signedAt: at,
      signatureId: signature.id,
    });
    if (form.kind === 'scrap') await markScrapped(tx, unit.id, at);
    await insertTrail(tx, actor, {
      action: `unit.${form.kind}`,
      entity: 'unit',
      entityId: unit.id,
      after: { dispositionId: id, serial: unit.serial, runId: run.id, action: form.action },
      reason: form.reason,
    });
    return done;
  });
}
