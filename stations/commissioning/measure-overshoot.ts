import type { Thresholds } from '@/lib/circuit/thresholds';
import { commissioningFault } from './commissioning-fault';
import { fitFlips, type Flip } from './fit-flips';
import type { ReferenceProbe } from './reference-probe';

const trials = 11;
/** Beyond this a supply is broken or its sense lines are. */
const overshootAtMost = 0.15;
/** Volts of the move towards the point; the smaller one tells whether overshoot scales with the step. */
const movesVolts = [1, 0.5];

/**
 * The overshoot by flips: a move towards a point that lands a known gap short of it flips the output when the overshoot
 * exceeds the gap, so the largest landing that does not flip bounds the overshoot. Both ways, the largest counts. A meter
 * cannot see the peak. Fraction of the step.
 */
export async function measureOvershoot(
  probe: ReferenceProbe,
  points: Thresholds,
  noiseVolts: number,
  onDone: (done: number, of: number) => void,
): Promise<number> {
  const of = movesVolts.length * 2 * trials;
  let done = 0;
  let largest = 0;
  for (const moveVolts of movesVolts)
    for (const land of [landAboveTrip, landBelowRelease]) {
      const flips: Flip[] = [];
      let [low, high] = [0, overshootAtMost];
      for (let trial = 0; trial < trials; trial++) {
        const gapVolts = ((low + high) / 2) * moveVolts;
        const { flipped, overshootNeeded } = await land(probe, points, gapVolts, moveVolts);
        flips.push({ at: -overshootNeeded, flipped });
        if (flipped) low = (low + high) / 2;
        else high = (low + high) / 2;
        // Once the bracket is within the noise, probe around it instead of inside it.
        const noise = noiseVolts / moveVolts;
        if (high - low < noise) [low, high] = [Math.max(0, low - noise), Math.min(overshootAtMost, high + noise)];
        onDone(++done, of);
      }
      if (flips.every((flip) => flip.flipped)) throw commissioningFault('overshootTooLarge');
      const scatter = Math.max(2e-4, noiseVolts / moveVolts);
      const fit = fitFlips(flips, { least: scatter / 2, most: scatter * 2 });
      largest = Math.max(largest, fit ? -fit.centre : 0);
    }
  if (largest > overshootAtMost * 0.95) throw commissioningFault('overshootTooLarge');
  return largest;
}

interface Landing {
  flipped: boolean;
  /** The overshoot, as a fraction of the move made, that just reaches the point. */
  overshootNeeded: number;
}

async function landAboveTrip(probe: ReferenceProbe, points: Thresholds, gap: number, move: number): Promise<Landing> {
  const landing = points.tripVolts + gap;
  const armed = await probe.armOn(points, landing + move, points.tripVolts + gap / 2);
  if (!armed) throw commissioningFault('flippedEarly');
  const from = probe.volts;
  await probe.step(landing);
  return { flipped: !probe.isOn, overshootNeeded: (probe.volts - points.tripVolts) / (from - probe.volts) };
}

async function landBelowRelease(
  probe: ReferenceProbe,
  points: Thresholds,
  gap: number,
  move: number,
): Promise<Landing> {
  const landing = points.releaseVolts - gap;
  const armed = await probe.armOff(points, landing - move, points.releaseVolts - gap / 2);
  if (!armed) throw commissioningFault('flippedEarly');
  const from = probe.volts;
  await probe.step(landing);
  return {
    flipped: probe.isOn,
    overshootNeeded: (points.releaseVolts - probe.volts) / (probe.volts - from),
  };
}
