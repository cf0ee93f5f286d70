import type { Thresholds } from '@/lib/circuit/thresholds';
import type { BoardType } from '@/lib/contracts/board-type';
import type { CommissioningValues } from '@/lib/run/types';
import type { Clock } from '../clock/clock';
import type { Bench } from '../instruments/open-bench';
import { commissioningFault } from './commissioning-fault';
import { agree, findReferencePoints } from './find-reference-points';
import { measureNoise } from './measure-noise';
import { measureOvershoot } from './measure-overshoot';
import { measureSettling } from './measure-settling';
import { ReferenceProbe } from './reference-probe';

export const commissioningSteps = ['points', 'settling', 'noise', 'overshoot'] as const;
export type CommissioningStep = (typeof commissioningSteps)[number];

export interface CommissioningJob {
  bench: Bench;
  boardType: BoardType;
  /** The reference board's known points. */
  check: Thresholds & { toleranceVolts: number };
  signal: AbortSignal;
  onProgress(step: CommissioningStep, done: number, of: number): void;
}

/**
 * Measures a station with its reference board, seated and under a closed lid: settling, noise and the overshoot bound.
 * Rejects with a fault that carries a code when it cannot, or with the signal's reason. Leaves the supply on: switch it
 * off with read-back afterwards, whatever came of it.
 */
export async function commissionBench(job: CommissioningJob, clock: Clock): Promise<CommissioningValues> {
  const { bench, boardType, check, signal, onProgress } = job;
  const probe = new ReferenceProbe(bench, boardType, clock, signal);
  const tell = (step: CommissioningStep) => (done: number, of: number) => onProgress(step, done, of);
  await probe.energise();
  const about = await findReferencePoints(probe, check, tell('points'));
  await probe.armOff(about, boardType.search.supplyMinVolts, about.releaseVolts);
  const { settleMs, waypointMs } = await measureSettling(probe, tell('settling'));
  const { points, noiseVolts } = await measureNoise(probe, about, tell('noise'));
  if (!agree(points, check, check.toleranceVolts)) throw commissioningFault('pointsOff');
  const overshoot = await measureOvershoot(probe, points, noiseVolts, tell('overshoot'));
  return { overshoot, settleMs, waypointMs, noiseVolts };
}
