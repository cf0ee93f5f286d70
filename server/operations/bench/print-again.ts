import type { Database } from '@/db/client';
import { findNewestLabel } from '@/db/queries/runs-bench';
import { findStationPrinter, type BenchRow } from '@/db/queries/station-benches';
import { insertTrail } from '@/db/queries/trail';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchPlace, BenchRefusal } from '@/lib/bench/types';
import { printLabel } from '../labels/print-label';

/** One more label of a board that passed, at this station's printer. Who asked is kept. */
export async function printAgain(
  db: Database,
  bench: BenchRow,
  serial: string,
  { accountId }: BenchPlace,
): Promise<BenchAnswerTo<'print-label'> | BenchRefusal> {
  const before = await findNewestLabel(db, serial);
  if (!before || !accountId) return { ok: false, refusal: say('not-now') };
  await db.transaction(async (tx) => {
    const printerId = await findStationPrinter(tx, bench.id);
    const { id } = await printLabel(tx, { unitId: before.unitId, runId: before.runId, printerId });
    await insertTrail(
      tx,
      { accountId, stationId: bench.id },
      { action: 'label.printed-again', entity: 'label', entityId: id, after: { serial } },
    );
  });
  return { ok: true, kind: 'print-label', value: { label: { serial, state: 'waiting', problem: null } } };
}
