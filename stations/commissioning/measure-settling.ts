import { commissioningFault } from './commissioning-fault';
import type { ReferenceProbe } from './reference-probe';

/** Waits tried, milliseconds after the supply has taken a command: the same instant from which a dwell counts. */
const waitsMs = [0, 5, 10, 15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 100, 120, 150, 200, 300];
const restMs = 400;
const stepVolts = 1;
/** Settled: within this part of the step. */
const settledWithin = 0.01;
const shortCycles = 0.1;
const roundToMs = 5;

export interface Settling {
  settleMs: number;
  /** When the first peak has passed. */
  waypointMs: number;
}

/**
 * How long the supply takes after a step, both ways, with the output off. One reading a step at ever longer waits, since
 * a link is too slow to follow a single one.
 */
export async function measureSettling(
  probe: ReferenceProbe,
  onDone: (done: number, of: number) => void,
): Promise<Settling> {
  const { bench, clock, boardType } = probe;
  const low = boardType.search.supplyMinVolts;
  await probe.step(low);
  const deviations: number[] = [];
  const peaks: number[] = [];
  for (const [index, waitMs] of waitsMs.entries()) {
    let largest = 0;
    let beyond = -Infinity;
    for (const target of [low + stepVolts, low]) {
      // Read before as well, so that the relay and the integration time stand already.
      const from = await bench.meter.readVolts(101, shortCycles);
      await bench.supply.setVolts(target);
      await clock.sleep(waitMs, probe.signal);
      const early = await bench.meter.readVolts(101, shortCycles);
      await clock.sleep(restMs, probe.signal);
      const final = await bench.meter.readVolts(101, shortCycles);
      const part = (early - final) / (final - from);
      largest = Math.max(largest, Math.abs(part));
      beyond = Math.max(beyond, part);
    }
    deviations.push(largest);
    peaks.push(beyond);
    onDone(index + 1, waitsMs.length);
  }
  const settled = waitsMs.findIndex((_wait, i) => deviations.slice(i).every((part) => part <= settledWithin));
  if (settled < 0 || settled === waitsMs.length - 1) throw commissioningFault('notSettling');
  const peak = peaks.indexOf(Math.max(...peaks));
  const waypointMs = Math.max(2 * roundToMs, Math.min(waitsMs[peak]!, waitsMs[settled]!));
  const settleMs = Math.max(waitsMs[settled]!, waypointMs);
  await probe.step(low, restMs);
  return { settleMs, waypointMs };
}
