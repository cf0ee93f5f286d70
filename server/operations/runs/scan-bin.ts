import type { Database } from '@/db/client';
import { findRunAwaitingBin, setBinScan } from '@/db/queries/runs-bench';
import type { BenchRow } from '@/db/queries/station-benches';
import { findBenchLot } from '@/db/queries/station-lots';
import { readScan } from '@/lib/bench/scan-code';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchAsk, BenchPlace, BenchRefusal } from '@/lib/bench/types';
import { readLotStrip } from './lot-strip';

/** The rejected board lies in its bin: the station may go on. A second scan of the same changes nothing. */
export async function scanBin(
  db: Database,
  bench: BenchRow,
  ask: Extract<BenchAsk, { kind: 'bin' }>,
  who: BenchPlace,
): Promise<BenchAnswerTo<'bin'> | BenchRefusal> {
  if (ask.binCode !== bench.binCode) {
    const [scanned, bin] = [readScan(ask.binCode).short, readScan(bench.binCode).short];
    return { ok: false, refusal: say('wrong-bin', { scanned, bin }) };
  }
  const awaiting = await findRunAwaitingBin(db, bench.id);
  if (awaiting?.runId === ask.runId) await setBinScan(db, ask.runId, ask.binCode, new Date());
  const lot = who.lotId ? await findBenchLot(db, { lotId: who.lotId }) : null;
  return { ok: true, kind: 'bin', value: { lot: lot && (await readLotStrip(db, lot)) } };
}
