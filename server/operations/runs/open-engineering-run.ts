import type { Database } from '@/db/client';
import { findAccount } from '@/db/queries/accounts';
import { findOpenOffer } from '@/db/queries/engineering-offers';
import { listFoundPoints } from '@/db/queries/runs-bench';
import { findOpenRunOfUnit, insertRun, nextEngineeringAttempt } from '@/db/queries/runs-open';
import type { BenchRow } from '@/db/queries/station-benches';
import { findUnitBySerial } from '@/db/queries/station-lots';
import { findCommissioning } from '@/db/queries/station-readiness';
import { findUnitRecord } from '@/db/queries/unit-records';
import { say } from '@/lib/bench/sayings';
import type { BenchAsk, BenchPlace } from '@/lib/bench/types';
import { boardStanding } from '@/lib/decision/board-standing';
import { refuseTrialBoard } from '@/lib/run/admit-board';
import type { RunPlan } from '@/lib/run/types';
import { lotPrior } from '@/lib/search/lot-prior';
import { admitTrial } from '../bench/read-standing';
import { mayTakeOffers } from '../bench/take-offer';
import { insertOpenRun, refuse, trailSerialByHand, type BoardAnswer } from './open-run';
import { mostEarlierBoards, planBasis } from './plan-run';

type TrialAsk = Extract<BenchAsk, { kind: 'board' }> & { offerId: string };

/**
 * A board scanned in a trial: run with the draft as it was offered, outside production. The station must be as fit as for
 * production; the board need not belong to a lot.
 */
export async function openEngineeringRun(
  db: Database,
  bench: BenchRow,
  { serial, offerId, byHand }: TrialAsk,
  { accountId }: BenchPlace,
): Promise<BoardAnswer> {
  const [account, offer, commissioning, unit] = await Promise.all([
    accountId ? findAccount(db, accountId) : null,
    findOpenOffer(db, bench.id),
    findCommissioning(db, bench.id),
    findUnitBySerial(db, serial),
  ]);
  if (!account || !mayTakeOffers(account.roles)) return refuse(say('not-permitted'));
  if (offer?.id !== offerId) return refuse(say('offer-ended'));
  const { reasons } = await admitTrial(db, bench, account.id, offer);
  if (reasons[0] || !commissioning) return refuse(reasons[0] ?? say('commissioning-missing'));

  const [record, inTest] = unit
    ? await Promise.all([findUnitRecord(db, unit.unitId), findOpenRunOfUnit(db, unit.unitId)])
    : [null, null];
  const refusal = refuseTrialBoard({
    serial,
    offer: { boardTypeCode: offer.boardTypeCode, serialPattern: offer.boardType.serialPattern },
    unit: unit && { isOfType: unit.boardTypeId === offer.boardTypeId, standing: boardStanding(record!) },
    inTestAt: inTest?.stationCode ?? null,
  });
  if (refusal) return refuse(refusal);

  return insertOpenRun(db, serial, async (tx) => {
    const plan: RunPlan = {
      ...planBasis(bench, commissioning),
      serial,
      attempt: await nextEngineeringAttempt(tx, unit?.unitId ?? null, serial),
      boardType: offer.boardType,
      sequence: offer.sequence,
      sequenceRevision: `r${offer.revisionNumber} draft`,
      prior: unit && lotPrior(await listFoundPoints(tx, unit.lotId, mostEarlierBoards)),
    };
    await insertRun(tx, {
      id: plan.runId,
      kind: 'engineering',
      offerId,
      unitId: unit?.unitId ?? null,
      lotId: unit?.lotId ?? null,
      stationId: bench.id,
      operatorId: account.id,
      attempt: plan.attempt,
      plan,
    });
    if (byHand) await trailSerialByHand(tx, plan, { accountId: account.id, stationId: bench.id });
    return { plan, check: null, engineering: true };
  });
}
