import { findNewestPass, findUnitForUpdate } from '@/db/queries/units-decisions';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';
import { printLabel } from '../labels/print-label';

/** One more label of a board that passed, at the printer of the station that passed it. Codes: unit-unknown, not-passed, no-printer. */
export async function printLabelAgain(actor: Actor, unitId: string): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const unit = await findUnitForUpdate(tx, unitId);
    if (!unit) return refusal('unit-unknown', 'This board does not exist.');
    const pass = await findNewestPass(tx, unitId);
    if (!pass) return refusal('not-passed', 'Only a board that passed has a label.');
    if (!pass.printerId)
      return refusal(
        'no-printer',
        'The station has no label printer. Print the label from this page, or choose a printer.',
      );
    const { id } = await printLabel(tx, { unitId, runId: pass.runId, printerId: pass.printerId });
    await insertTrail(tx, actor, {
      action: 'label.printed-again',
      entity: 'label',
      entityId: id,
      after: { serial: unit.serial },
    });
    return done;
  });
}
