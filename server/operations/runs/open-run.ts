import type { Database, Transaction } from '@/db/client';
import { findAccount } from '@/db/queries/accounts';
import { findOpenRunOfUnit, insertRun, nextAttempt, useRetestOrder } from '@/db/queries/runs-open';
import type { BenchRow } from '@/db/queries/station-benches';
import { findBenchLot, findUnitBySerial } from '@/db/queries/station-lots';
import { findReferenceBoard } from '@/db/queries/station-references';
import { findCommissioning } from '@/db/queries/station-readiness';
import { findUnitRecord } from '@/db/queries/unit-records';
import { insertTrail } from '@/db/queries/trail';
import { mayDo } from '@/lib/access/permissions';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchAsk, BenchPlace, BenchRefusal } from '@/lib/bench/types';
import type { Say } from '@/lib/contracts/bench-view';
import { boardStanding } from '@/lib/decision/board-standing';
import { admitBoard } from '@/lib/run/admit-board';
import type { RunPlan } from '@/lib/run/types';
import { admitBench } from '../bench/read-standing';
import { openEngineeringRun } from './open-engineering-run';
import { openReferenceRun } from './open-reference-run';
import { planBoard } from './plan-run';

type BoardAsk = Extract<BenchAsk, { kind: 'board' }>;
export type BoardAnswer = BenchAnswerTo<'board'> | BenchRefusal;

export const refuse = (refusal: Say): BenchRefusal => ({ ok: false, refusal });

/**
 * A board was scanned: may it be tested here now? If so its run is opened, one a station and one a unit. The record decides
 * again under the lock of the unique indexes, so that two benches cannot take the same board.
 */
export async function openRun(db: Database, bench: BenchRow, ask: BoardAsk, who: BenchPlace): Promise<BoardAnswer> {
  const reference = await findReferenceBoard(db, ask.serial);
  if (reference) return openReferenceRun(db, bench, reference, who);
  if (ask.offerId) return openEngineeringRun(db, bench, { ...ask, offerId: ask.offerId }, who);
  const [account, lot] = await Promise.all([
    who.accountId ? findAccount(db, who.accountId) : null,
    ask.lotId ? findBenchLot(db, { lotId: ask.lotId }) : null,
  ]);
  if (!account || !mayDo(account.roles, 'test-boards')) return refuse(say('not-permitted'));
  if (!lot) return refuse(say('lot-first'));
  const { reasons } = await admitBench(db, bench, account.id, lot);
  const commissioning = await findCommissioning(db, bench.id);
  if (reasons[0] || !commissioning) return refuse(reasons[0] ?? say('commissioning-missing'));

  const unit = await findUnitBySerial(db, ask.serial);
  const record = unit && (await findUnitRecord(db, unit.unitId));
  const inTest = unit && (await findOpenRunOfUnit(db, unit.unitId));
  const admission = admitBoard({
    serial: ask.serial,
    lot: {
      code: lot.code,
      state: lot.state,
      held: lot.heldAt !== null,
      boardTypeCode: lot.boardTypeCode,
      serialPattern: lot.boardType.serialPattern,
    },
    unit: unit && record && { lotCode: unit.lotCode, standing: boardStanding(record) },
    inTestAt: inTest?.stationCode ?? null,
    sequence: { number: lot.sequenceNumber, status: lot.sequenceStatus, withdrawnReason: lot.withdrawnReason },
  });
  if (!admission.allowed) return refuse(admission.refusal);

  const { unitId } = unit!;
  return insertOpenRun(db, ask.serial, async (tx) => {
    const attempt = await nextAttempt(tx, unitId);
    const plan = await planBoard(tx, bench, lot, commissioning, { serial: ask.serial, attempt });
    await insertRun(tx, {
      id: plan.runId,
      kind: 'production',
      unitId,
      lotId: lot.lotId,
      stationId: bench.id,
      operatorId: account.id,
      attempt,
      plan,
    });
    if (admission.retestOrderId) await useRetestOrder(tx, admission.retestOrderId, plan.runId);
    if (ask.byHand) await trailSerialByHand(tx, plan, { accountId: account.id, stationId: bench.id });
    return { plan, check: null, engineering: false };
  });
}

/** A serial that nobody scanned: who typed it is kept. */
export async function trailSerialByHand(
  tx: Transaction,
  { runId, serial }: RunPlan,
  who: { accountId: string; stationId: string },
): Promise<void> {
  await insertTrail(tx, who, { action: 'run.serial-by-hand', entity: 'run', entityId: runId, after: { serial } });
}

/** Opens a run in one transaction; a station or board that another run holds is refused, not an error. */
export async function insertOpenRun(
  db: Database,
  serial: string,
  open: (tx: Transaction) => Promise<BenchAnswerTo<'board'>['value']>,
): Promise<BoardAnswer> {
  try {
    return { ok: true, kind: 'board', value: await db.transaction(open) };
  } catch (error) {
    switch (brokenConstraint(error)) {
      case 'runs_one_open_per_station':
        return refuse(say('station-in-use'));
      case 'runs_one_open_per_unit':
      case 'runs_attempt_of_unit':
        return refuse(say('board-in-test', { serial, station: '' }));
      default:
        throw error;
    }
  }
}

function brokenConstraint(error: unknown): string | null {
  const cause =
    error instanceof Error ? (error.cause as { code?: string; constraint?: string } | undefined) : undefined;
  return cause?.code === '23505' ? (cause.constraint ?? null) : null;
}
