import type { BenchRow } from '@/db/queries/station-benches';
import type { Commissioning } from '@/db/queries/station-readiness';
import type { StationKind } from '@/lib/sequence/station-kind';
import { planBasis } from '../runs/plan-run';

/** A station as the rules and the prediction see it. */
export function stationKindOf(bench: BenchRow, measured: Commissioning): StationKind {
  const { commissioning, hasController, hasWiperProbe, meter } = planBasis(bench, measured);
  return { commissioning, hasController, hasWiperProbe, meter, baudRate: bench.link.baudRate };
}
