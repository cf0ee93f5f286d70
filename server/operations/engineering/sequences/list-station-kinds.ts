import type { Database } from '@/db/client';
import { listBenches } from '@/db/queries/station-benches';
import { findCommissioning } from '@/db/queries/station-readiness';
import type { DraftPage } from '@/lib/contracts/sequence-draft';
import { linkHasController } from '@/lib/contracts/station-link';
import { usualStation } from '@/lib/prediction/types';
import { stationKindOf } from '../station-kind';

/** Stations that a draft can be checked for and offered to; one not commissioned yet is taken to measure as the usual one. */
export async function listStationKinds(db: Database): Promise<DraftPage['stations']> {
  const benches = await listBenches(db);
  return Promise.all(
    benches.map(async (bench) => {
      const measured = await findCommissioning(db, bench.id);
      const { code, name, link, hasWiperProbe } = bench;
      const station = measured
        ? stationKindOf(bench, measured)
        : { ...usualStation, hasController: linkHasController(link), hasWiperProbe, baudRate: link.baudRate };
      return { code, name, station };
    }),
  );
}
