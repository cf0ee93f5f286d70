import type { Database, Transaction } from '@/db/client';
import { insertRunEvents } from '@/db/queries/runs-open';
import { closeRun, findRunForUpdate, insertMeasurements, insertTraces } from '@/db/queries/runs-record';
import { findStationPrinter } from '@/db/queries/station-benches';
import { getReferencePoints, insertDailyCheck } from '@/db/queries/station-references';
import { findDailyCheck } from '@/db/queries/station-readiness';
import { compareReference } from '@/lib/bench/reference-check';
import { refusal, success, type Outcome } from '@/lib/contracts/outcome';
import type { RunCloser } from '@/lib/contracts/stored-states';
import { tracesOf } from '@/lib/run/traces';
import { checkHolds, holdAfterFailedCheck } from '../holds/check-holds';
import { freezeBaselines } from '../lots/freeze-baselines';
import { printLabel } from '../labels/print-label';
import { sealRun } from '../trail/seal-run';
import type { RunRecord } from './run-record';

type Run = NonNullable<Awaited<ReturnType<typeof findRunForUpdate>>>;

/** Hours that a passed daily check lasts where none was made before. */
const usualValidHours = 12;

/**
 * Stores a run that ended: its events, traces and measurements, its verdict, and the label or daily check that follows from
 * it, all or nothing. Exactly once: a run that is closed already is left as it is. Codes: run-unknown.
 */
export async function recordRun(
  db: Database,
  record: RunRecord,
  closedBy: RunCloser,
): Promise<Outcome<{ validUntilIso: string | null }>> {
  return db.transaction(async (tx) => {
    const run = await findRunForUpdate(tx, record.runId);
    if (!run) return refusal('run-unknown', `The database knows nothing of run ${record.runId}.`);
    if (run.endedAt) return success({ validUntilIso: null });
    await storeResults(tx, record);
    await close(tx, record, closedBy);
    await sealRun(tx, run, record.result.verdict);
    if (run.kind === 'production' && record.result.verdict !== 'no-verdict') {
      await freezeBaselines(tx, run.lotId!);
      await checkHolds(tx, { id: run.id, lotId: run.lotId!, stationId: run.stationId });
    }
    if (run.kind === 'production' && record.result.verdict === 'pass') {
      const printerId = await findStationPrinter(tx, run.stationId);
      await printLabel(tx, { unitId: run.unitId!, runId: run.id, printerId });
    }
    return success({ validUntilIso: run.kind === 'daily-check' ? await storeDailyCheck(tx, run, record) : null });
  });
}

async function storeResults(tx: Transaction, { runId, batches, result }: RunRecord): Promise<void> {
  const events = batches.flatMap((batch) => batch.events);
  await insertRunEvents(
    tx,
    runId,
    batches.map((batch) => ({ n: batch.n, batch: batch.events.map(({ event }) => event) })),
  );
  await insertTraces(tx, runId, tracesOf(events, events[0]?.event.atMs ?? 0));
  await insertMeasurements(tx, runId, result.measurements);
}

async function close(tx: Transaction, record: RunRecord, closedBy: RunCloser): Promise<void> {
  const { measurements: _stored, supplyOff, ...ending } = record.result;
  await closeRun(tx, record.runId, {
    ...ending,
    supplyOffConfirmed: supplyOff.confirmed,
    supplyOffVolts: supplyOff.volts,
    supplyOffBy: supplyOff.by,
    seconds: record.seconds,
    endedAt: new Date(record.endedAtIso),
    closedBy,
  });
}

/** Null when the check decided nothing: it is repeated. */
async function storeDailyCheck(tx: Transaction, run: Run, { result, endedAtIso }: RunRecord): Promise<string | null> {
  if (result.verdict === 'no-verdict') return null;
  const known = await getReferencePoints(tx, run.referenceBoardId!);
  const { passed, points } = compareReference(known, result);
  const validHours = (await findDailyCheck(tx, run.stationId))?.validHours ?? usualValidHours;
  const at = new Date(endedAtIso);
  const measured = (quantity: string) => points.find((point) => point.quantity === quantity)?.measuredVolts ?? null;
  await insertDailyCheck(tx, {
    stationId: run.stationId,
    referenceBoardId: run.referenceBoardId!,
    runId: run.id,
    tripVolts: measured('trip-volts'),
    releaseVolts: measured('release-volts'),
    passed,
    at,
    validHours,
    byAccountId: run.operatorId,
  });
  if (!passed) await holdAfterFailedCheck(tx, run.stationId, at);
  return passed ? new Date(at.getTime() + validHours * 3_600_000).toISOString() : null;
}
