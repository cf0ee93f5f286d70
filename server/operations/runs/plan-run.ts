import { randomInt, randomUUID } from 'node:crypto';
import type { Database, Transaction } from '@/db/client';
import { listFoundPoints } from '@/db/queries/runs-bench';
import type { BenchRow } from '@/db/queries/station-benches';
import type { BenchLot } from '@/db/queries/station-lots';
import type { Commissioning } from '@/db/queries/station-readiness';
import { linkHasController } from '@/lib/contracts/station-link';
import { isFastLink, pollMsAt } from '@/lib/run/link-pace';
import type { RunPlan } from '@/lib/run/types';
import { lotPrior } from '@/lib/search/lot-prior';

/**
 * Standard uncertainty of a 6½-digit multimeter near the points, on its 100 V range over a year: 45 ppm of the reading and
 * 6 ppm of the range, both rectangular; last digit 0.1 mV.
 */
const meter = { gain: 45e-6 / Math.sqrt(3), offsetVolts: (6e-6 * 100) / Math.sqrt(3), resolutionVolts: 1e-4 };

/** Boards of the lot whose found points shape where the search looks first. */
export const mostEarlierBoards = 60;

/** What every run of a station shares, whichever board is on it. */
export function planBasis(bench: BenchRow, { overshoot, settleMs, waypointMs, noiseVolts }: Commissioning) {
  const { baudRate } = bench.link;
  return {
    runId: randomUUID(),
    commissioning: { overshoot, settleMs, waypointMs, noiseVolts },
    hasController: linkHasController(bench.link),
    hasWiperProbe: bench.hasWiperProbe,
    pollMs: pollMsAt(baudRate),
    fastLink: isFastLink(baudRate),
    meter,
    seed: randomInt(2 ** 31),
  } satisfies Partial<RunPlan>;
}

export async function planBoard(
  db: Database | Transaction,
  bench: BenchRow,
  lot: BenchLot,
  commissioning: Commissioning,
  board: { serial: string; attempt: number },
): Promise<RunPlan> {
  return {
    ...planBasis(bench, commissioning),
    ...board,
    boardType: lot.boardType,
    sequence: lot.sequence,
    sequenceRevision: `r${lot.sequenceNumber}`,
    prior: lotPrior(await listFoundPoints(db, lot.lotId, mostEarlierBoards)),
  };
}
