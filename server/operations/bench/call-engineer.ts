import type { Database } from '@/db/client';
import type { BenchRow } from '@/db/queries/station-benches';
import { findStationCall, insertStationCall } from '@/db/queries/station-calls';
import type { BenchAnswerTo, BenchPlace } from '@/lib/bench/types';

/** Shown at the desks until somebody acknowledges it. Calling again while it is open changes nothing. */
export async function callEngineer(
  db: Database,
  bench: BenchRow,
  { accountId }: BenchPlace,
): Promise<BenchAnswerTo<'call-engineer'>> {
  await insertStationCall(db, { stationId: bench.id, byAccountId: accountId });
  const call = await findStationCall(db, bench.id);
  return {
    ok: true,
    kind: 'call-engineer',
    value: {
      call: { sinceIso: (call?.at ?? new Date()).toISOString(), acknowledgedBy: call?.acknowledgedByName ?? null },
    },
  };
}
