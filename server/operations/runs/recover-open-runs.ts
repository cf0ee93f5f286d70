import type { Database } from '@/db/client';
import { listOpenRuns, listRunEvents, type OpenRun } from '@/db/queries/runs-open';
import { advanceRun, beginRun, resultOf } from '@/lib/run/run';
import type { RunEvent, RunPlan, RunResult } from '@/lib/run/types';
import { currentGroup, viewRun } from '@/lib/run/view';
import { recordRun } from './record-run';
import type { EventBatch } from './run-record';

/** How the supply of a station was left when the program started again. */
export type SupplyFound = { confirmed: true; volts: number; by: 'meter' | 'supply' } | { confirmed: false };

/**
 * Closes what a crash left open, as no verdict: after the supplies were switched off and read back, which the caller has
 * done. What was measured before is kept, and a board that was already failing is marked so. Returns how many.
 */
export async function recoverOpenRuns(
  db: Database,
  supplyOf: (stationId: string) => SupplyFound,
  now = new Date(),
): Promise<number> {
  const open = await listOpenRuns(db);
  for (const run of open) await recover(db, run, supplyOf(run.stationId), now);
  return open.length;
}

async function recover(db: Database, run: OpenRun, supply: SupplyFound, now: Date): Promise<void> {
  const { batches, result } = replayBroken(run.plan, await listRunEvents(db, run.id), supply);
  const record = { runId: run.id, batches, result, seconds: null, endedAtIso: now.toISOString() };
  await recordRun(db, record, 'recovery');
}

/**
 * The run up to the crash, ended as interrupted. A reject that was decided but never recorded counts as failing when
 * stopped: a power cut launders nothing.
 */
export function replayBroken(
  plan: RunPlan,
  stored: readonly { n: number; batch: RunEvent[] }[],
  supply: SupplyFound,
): { batches: EventBatch[]; result: RunResult } {
  let atMs = stored[0]?.batch[0]?.atMs ?? 0;
  let { state } = beginRun(plan, atMs);
  const batches = stored.map(({ n, batch }) => ({
    n,
    events: batch.map((event) => {
      const during = currentGroup(viewRun(state));
      ({ state } = advanceRun(state, event));
      atMs = event.atMs;
      return { event, during };
    }),
  }));
  ({ state } = advanceRun(state, { kind: 'shutdown', atMs }));
  // What is outstanding now is the supply going off; the engine may ask again when it is not confirmed.
  while (state.outstanding) {
    ({ state } = advanceRun(state, { kind: 'supply-is-off', id: state.outstanding.id, atMs, ...supply }));
  }
  const ended = resultOf(state);
  if (!ended) throw new Error(`Run ${plan.runId} did not end when it was broken off.`);
  const result: RunResult = {
    ...ended,
    verdict: 'no-verdict',
    rejectReason: null,
    likelyCause: null,
    noVerdictReason: 'interrupted',
    failingWhenStopped: ended.failingWhenStopped || ended.verdict === 'reject',
    supplyOff: supply.confirmed ? supply : { confirmed: false, volts: null, by: null },
  };
  return { batches, result };
}
