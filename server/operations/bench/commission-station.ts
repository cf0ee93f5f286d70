import type { Database } from '@/db/client';
import { insertTrail } from '@/db/queries/trail';
import { findReferenceBoard, insertCommissioning } from '@/db/queries/station-references';
import type { BenchRow } from '@/db/queries/station-benches';
import { say } from '@/lib/bench/sayings';
import type { BenchAnswerTo, BenchRefusal } from '@/lib/bench/types';
import type { CommissioningValues } from '@/lib/run/types';

/** What a commissioning is worth before it must be made again. */
const validDays = 180;

/** The reference board that an engineer scanned. */
export async function answerReference(db: Database, code: string): Promise<BenchAnswerTo<'reference'> | BenchRefusal> {
  const found = await findReferenceBoard(db, code);
  if (!found) return { ok: false, refusal: say('reference-unknown', { reference: code }) };
  const { tripVolts, releaseVolts, toleranceVolts } = found.board;
  const check = { referenceCode: code, tripVolts, releaseVolts, toleranceVolts };
  return { ok: true, kind: 'reference', value: { check, boardType: found.boardType } };
}

/** Stores what an engineer's commissioning measured. An overshoot that the search cannot learn is stored too: it says why the station may not test. */
export async function commissionStation(
  db: Database,
  bench: BenchRow,
  values: CommissioningValues,
  by: { accountId: string; referenceCode: string },
): Promise<void> {
  const reference = await findReferenceBoard(db, by.referenceCode);
  if (!reference) throw new Error(`There is no reference board ${by.referenceCode}.`);
  const at = new Date();
  await insertCommissioning(db, {
    ...values,
    stationId: bench.id,
    referenceBoardId: reference.board.id,
    at,
    validUntil: new Date(at.getTime() + validDays * 24 * 3_600_000),
    byAccountId: by.accountId,
  });
  await insertTrail(
    db,
    { accountId: by.accountId, stationId: bench.id },
    { action: 'station.commissioned', entity: 'station', entityId: bench.id, after: { ...values } },
  );
}
