import type { Database } from '@/db/client';
import type { BenchRow } from '@/db/queries/station-benches';
import { findBenchLot } from '@/db/queries/station-lots';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchAsk, BenchPlace, BenchRefusal } from '@/lib/bench/types';
import type { Say } from '@/lib/contracts/bench-view';
import { refuseSequence } from '@/lib/run/admit-board';
import { readLotStrip } from '../runs/lot-strip';
import { nextRunOf } from './next-run';
import { readStanding } from './read-standing';

/** A lot sheet was scanned or a lot chosen: the bench works on it from now on. */
export async function takeLot(
  db: Database,
  bench: BenchRow,
  ask: Extract<BenchAsk, { kind: 'lot' }>,
  who: BenchPlace,
): Promise<BenchAnswerTo<'lot'> | BenchRefusal> {
  const refuse = (refusal: Say): BenchRefusal => ({ ok: false, refusal });
  const lot = await findBenchLot(db, ask.by);
  if (!lot) return refuse(say('lot-unknown', { lot: 'code' in ask.by ? ask.by.code : '' }));
  if (lot.heldAt) return refuse(say('lot-on-hold', { lot: lot.code }));
  if (lot.state === 'paused') return refuse(say('lot-paused', { lot: lot.code }));
  if (lot.state !== 'open') return refuse(say('lot-not-open', { lot: lot.code }));
  const { sequenceNumber: number, sequenceStatus: status, withdrawnReason } = lot;
  const unusable = refuseSequence({ number, status, withdrawnReason }, lot.boardTypeCode);
  if (unusable) return refuse(unusable);
  const [strip, { standing }] = await Promise.all([
    readLotStrip(db, lot),
    readStanding(db, bench, { ...who, lotId: lot.lotId, offerId: null }),
  ]);
  return { ok: true, kind: 'lot', value: { lot: strip, next: nextRunOf(lot), standing } };
}
