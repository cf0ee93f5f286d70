import { getLotBoardType, insertBaselines, listEarlierLots } from '@/db/queries/chart-baselines';
import { findLotForUpdate } from '@/db/queries/lots';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import type { ChooseBaseline } from '@/lib/contracts/lot-review';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { baselineCandidate } from '@/lib/quality/baseline-candidate';
import { lotsBaseline } from '@/lib/quality/frozen-baseline';
import { database } from '@/server/postgres';
import { listBaselineValues } from './list-baseline-candidates';

/**
 * Draws a lot's chart, or those of all later lots of its board type, from earlier stable lots. Codes: lot-unknown,
 * lot-of-other-type, lot-too-small, lot-not-stable.
 */
export async function chooseBaseline(actor: Actor, input: ChooseBaseline): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const lot = await findLotForUpdate(tx, input.lotId);
    if (!lot) return refusal('lot-unknown', 'This lot does not exist.');
    const type = await getLotBoardType(tx, lot.id);
    const earlier = new Map((await listEarlierLots(tx, type)).map(({ id, code }) => [id, code]));
    const series: number[][] = [];
    // Oldest first, as they were tested.
    for (const id of [...earlier.keys()].reverse().filter((each) => input.fromLotIds.includes(each))) {
      const values = await listBaselineValues(tx, id, input.quantity);
      const candidate = baselineCandidate(values);
      if (!candidate) return refusal('lot-too-small', `Lot ${earlier.get(id)} has too few boards.`, 'fromLotIds');
      if (!candidate.stable)
        return refusal(
          'lot-not-stable',
          `Lot ${earlier.get(id)} was not stable. Limits from it would hide a drift.`,
          'fromLotIds',
        );
      series.push(values);
    }
    if (series.length < new Set(input.fromLotIds).size)
      return refusal('lot-of-other-type', 'Choose earlier lots of the same board type.', 'fromLotIds');
    const figures = lotsBaseline(series)!;
    await insertBaselines(tx, [
      {
        quantity: input.quantity,
        lotId: input.scope === 'lot' ? lot.id : null,
        boardTypeId: type.boardTypeId,
        ...figures,
        fromLotIds: input.fromLotIds,
        frozenBy: actor.accountId,
      },
    ]);
    await insertTrail(tx, actor, {
      action: 'baseline.chosen',
      entity: 'lot',
      entityId: lot.id,
      after: {
        quantity: input.quantity,
        scope: input.scope,
        fromLots: input.fromLotIds.map((id) => earlier.get(id)),
        ...figures,
      },
      reason: input.reason,
    });
    return done;
  });
}
