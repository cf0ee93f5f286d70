import type { Database } from '@/db/client';
import { findBenchByCode } from '@/db/queries/station-benches';
import { findCommissioning } from '@/db/queries/station-readiness';
import { linkHasController } from '@/lib/contracts/station-link';
import { usualStation } from '@/lib/prediction/types';
import type { StationKind } from '@/lib/sequence/station-kind';

/** What a station is to a dry run; the usual one where none is chosen, or where the chosen one has never been commissioned. */
export async function stationOf(db: Database, code: string | null): Promise<StationKind> {
  const bench = code === null ? null : await findBenchByCode(db, code);
  if (!bench) return usualStation;
  const commissioning = await findCommissioning(db, bench.id);
  const { overshoot, settleMs, waypointMs, noiseVolts } = commissioning ?? usualStation.commissioning;
  return {
    ...usualStation,
    hasController: linkHasController(bench.link),
    hasWiperProbe: bench.hasWiperProbe,
    baudRate: bench.link.baudRate,
    commissioning: { overshoot, settleMs, waypointMs, noiseVolts },
  };
}
