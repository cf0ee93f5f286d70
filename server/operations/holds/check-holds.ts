import type { Transaction } from '@/db/client';
import { findBaseline, getLotBoardType } from '@/db/queries/chart-baselines';
import {
  findLastGoodCheck,
  findLastRelease,
  findRuleSet,
  getStationCode,
  listHoldBoards,
  listLotsPassedAt,
} from '@/db/queries/lot-holds';
import { holdCause, usualRuleSet } from '@/lib/quality/hold-cause';
import { raiseHold } from './raise-hold';

/** Whether the run that was closed in this transaction makes a rule hold its lot. */
export async function checkHolds(
  tx: Transaction,
  run: { id: string; lotId: string; stationId: string },
): Promise<void> {
  const lot = await getLotBoardType(tx, run.lotId);
  const rules = (await findRuleSet(tx, lot.boardTypeId))?.rules ?? usualRuleSet;
  const boards = await listHoldBoards(tx, lot.id, await findLastRelease(tx, lot.id));
  const cause = holdCause(boards, rules, await findBaseline(tx, lot, 'trip-volts'));
  if (cause) await raiseHold(tx, lot.id, cause, { runId: run.id, stationId: run.stationId });
}

/** A daily check that failed makes suspect what the station passed since its last good one: those lots are held. */
export async function holdAfterFailedCheck(tx: Transaction, stationId: string, at: Date): Promise<void> {
  const lastGood = await findLastGoodCheck(tx, stationId, at);
  const stationCode = await getStationCode(tx, stationId);
  for (const { lotId, boardTypeId, boards } of await listLotsPassedAt(tx, stationId, lastGood ?? new Date(0))) {
    const rules = (await findRuleSet(tx, boardTypeId))?.rules ?? usualRuleSet;
    if (!rules.failedCheck) continue;
    const detail = {
      cause: 'failed-check' as const,
      stationCode,
      lastGoodCheckIso: lastGood?.toISOString() ?? null,
      suspectBoards: boards,
    };
    await raiseHold(tx, lotId, detail, { runId: null, stationId }, at);
  }
}
