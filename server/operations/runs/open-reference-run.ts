import type { Database } from '@/db/client';
import { insertRun } from '@/db/queries/runs-open';
import type { BenchRow } from '@/db/queries/station-benches';
import { findReleasedSequence, type findReferenceBoard } from '@/db/queries/station-references';
import { findCommissioning } from '@/db/queries/station-readiness';
import { planReferenceCheck } from '@/lib/bench/reference-check';
import { say } from '@/lib/bench/sayings';
import type { BenchPlace } from '@/lib/bench/types';
import { overshootIsLearnable } from '@/lib/search/overshoot-range';
import { insertOpenRun, refuse, type BoardAnswer } from './open-run';
import { planBasis } from './plan-run';

type Reference = NonNullable<Awaited<ReturnType<typeof findReferenceBoard>>>;

/**
 * The daily check: a run that finds the points of the reference board and compares them with the known ones. It needs a
 * commissioned station, and is what renews the rest.
 */
export async function openReferenceRun(
  db: Database,
  bench: BenchRow,
  { board, boardType }: Reference,
  { accountId }: BenchPlace,
): Promise<BoardAnswer> {
  if (!accountId) return refuse(say('sign-in-first'));
  const [commissioning, released] = await Promise.all([
    findCommissioning(db, bench.id),
    findReleasedSequence(db, board.boardTypeId),
  ]);
  if (!commissioning) return refuse(say('commissioning-missing'));
  if (commissioning.validUntil < new Date()) return refuse(say('commissioning-ended'));
  if (!overshootIsLearnable(commissioning.overshoot)) return refuse(say('commissioning-missing'));
  if (!released) return refuse(say('sequence-not-released', { boardType: boardType.code }));
  const check = { referenceCode: board.code, ...board };
  const planned = planReferenceCheck(check, boardType, released.sequence);
  return insertOpenRun(db, board.code, async (tx) => {
    const plan = {
      ...planBasis(bench, commissioning),
      ...planned,
      serial: board.code,
      attempt: 1,
      sequenceRevision: `r${released.number}`,
      prior: null,
    };
    await insertRun(tx, {
      id: plan.runId,
      kind: 'daily-check',
      referenceBoardId: board.id,
      stationId: bench.id,
      operatorId: accountId,
      attempt: 1,
      plan,
    });
    const { referenceCode, tripVolts, releaseVolts, toleranceVolts } = check;
    return { plan, check: { referenceCode, tripVolts, releaseVolts, toleranceVolts }, engineering: false };
  });
}
