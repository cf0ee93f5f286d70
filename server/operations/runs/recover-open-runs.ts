import type { Database } from '@/db/client';
import { listOpenRuns, listRunEvents, type OpenRun } from '@/db/queries/runs-open';
import { brokenRun } from '@/lib/run/broken-run';
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
  log: Log,
  now = new Date(),
): Promise<number> {
  const open = await listOpenRuns(db);
  for (const run of open) await recover(db, run, supplyOf(run.stationId), log, now);
  return open.length;
}

interface Log {
  warn(details: object, message: string): void;
}

/**
 * A station that is free has no open run, unless the answer that opened one was lost on the way: such a run never began on a
 * fixture, and is closed.
 */
export async function closeLostRun(db: Database, stationId: string, log: Log): Promise<void> {
  const open = await listOpenRuns(db);
  for (const run of open)
    if (run.stationId === stationId) await recover(db, run, { confirmed: false }, log, new Date());
}

async function recover(db: Database, run: OpenRun, supply: SupplyFound, log: Log, now: Date): Promise<void> {
  const { batches, result } = replayOrClose(run, await listRunEvents(db, run.id), supply, log);
  const record = { runId: run.id, batches, result, seconds: null, endedAtIso: now.toISOString() };
  await recordRun(db, record, 'recovery');
}

type StoredEvents = readonly { n: number; batch: RunEvent[] }[];

/** A record that this version cannot replay is closed all the same: a station must not be held up by it. */
function replayOrClose(run: OpenRun, stored: StoredEvents, supply: SupplyFound, log: Log) {
  try {
    return replayBroken(run.plan, stored, supply);
  } catch (error) {
    log.warn({ error, runId: run.id }, 'an interrupted run cannot be replayed; it is closed without measurements');
    return { batches: [], result: brokenRun(supply) };
  }
}

/**
 * The run up to the crash, ended as interrupted. A reject that was decided but never recorded counts as failing when
 * stopped: a power cut launders nothing.
 */
export function replayBroken(
  plan: RunPlan,
  stored: StoredEvents,
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
  const { measurements, trimRounds, turnsAdvised, adjustments } = ended;
  const result: RunResult = {
    ...brokenRun(supply),
    failingWhenStopped: ended.failingWhenStopped || ended.verdict === 'reject',
    measurements,
    trimRounds,
    turnsAdvised,
    adjustments,
  };
  return { batches, result };
}
