import { findLotForUpdate, updateLot } from '@/db/queries/lots';
import { findOpenRunOfLot } from '@/db/queries/lots-runs';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { LotChange } from '@/lib/contracts/lot';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import type { LotState } from '@/lib/contracts/stored-states';
import { database } from '@/server/postgres';

const stateAfter: Record<LotChange, LotState> = { open: 'open', pause: 'paused', close: 'closed' };
const words: Record<LotState, string> = { open: 'open', paused: 'paused', closed: 'closed' };

/**
 * Opens, pauses or closes a lot. A run that is under way finishes; a lot is closed only when none is. A closed lot can be
 * opened again. Codes: lot-unknown, lot-unchanged, lot-in-test.
 */
export async function changeLot(actor: Actor, lotId: string, change: LotChange): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    const state = stateAfter[change];
    if (lot.state === state) return refusal('lot-unchanged', `Lot ${lot.code} is ${words[state]} already.`);
    if (change === 'close') {
      const run = await findOpenRunOfLot(tx, lotId);
      if (run)
        return refusal(
          'lot-in-test',
          `Board ${run.serial} is in test at station ${run.stationCode}. Close the lot when it is done.`,
        );
    }
    await updateLot(tx, lotId, { state, closedAt: state === 'closed' ? new Date() : null });
    await insertTrail(tx, actor, {
      action: `lot.${state === 'open' ? 'opened' : state}`,
      entity: 'lot',
      entityId: lotId,
      before: { state: lot.state },
      after: { state },
    });
    return done;
  });
}
