import { listBenches } from '@/db/queries/station-benches';
import { environment } from '@/server/environment';
import { database } from '@/server/postgres';

export interface BenchDoor {
  code: string;
  name: string;
  fixture: string;
  simulated: boolean;
  /** `open`: this browser stands there. `stand`: in the demo it may. `watch`: a desk looks on. */
  way: 'open' | 'stand' | 'watch';
}

/** The benches that a browser can go to from here. Nothing is told to a stranger. */
export async function listBenchDoors(visitor: { signedIn: boolean; enrolledAt: string | null }): Promise<BenchDoor[]> {
  const benches = await listBenches(database());
  const { demo } = environment();
  return benches.flatMap(({ code, name, fixture, link }) => {
    const simulated = link.kind === 'simulated';
    const way = code === visitor.enrolledAt ? 'open' : demo && simulated ? 'stand' : visitor.signedIn ? 'watch' : null;
    return way ? [{ code, name, fixture, simulated, way }] : [];
  });
}
