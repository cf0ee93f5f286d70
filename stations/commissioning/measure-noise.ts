import type { Thresholds } from '@/lib/circuit/thresholds';
import { commissioningFault } from './commissioning-fault';
import { fitFlips, type Flip } from './fit-flips';
import type { ReferenceProbe } from './reference-probe';

const passages = 10;
/** Steps so small that no overshoot matters. */
const creepVolts = 0.001;
/** Further away at each new try, where the scatter is large. */
const startsBeforeVolts = [0.008, 0.016, 0.032];
const mostCreeps = 80;
const scatters = { least: 1e-4, most: 1e-2 };

export interface CreptPoints {
  points: Thresholds;
  noiseVolts: number;
}

/** Trip and release by creeping up to them again and again in steps of a millivolt, with the scatter of a single probe. */
export async function measureNoise(
  probe: ReferenceProbe,
  about: Thresholds,
  onDone: (done: number, of: number) => void,
): Promise<CreptPoints> {
  const flips: Record<'trip' | 'release', Flip[]> = { trip: [], release: [] };
  let { tripVolts, releaseVolts } = about;
  for (let pass = 0; pass < passages; pass++) {
    // The mean of what was seen, with the first guess weighing as much as one passage.
    tripVolts += ((await creepDown(probe, { tripVolts, releaseVolts }, flips.trip)) - tripVolts) / (pass + 2);
    releaseVolts += ((await creepUp(probe, { tripVolts, releaseVolts }, flips.release)) - releaseVolts) / (pass + 2);
    onDone(pass + 1, passages);
  }
  const trip = fitFlips(flips.trip, scatters);
  const release = fitFlips(flips.release, scatters);
  if (!trip || !release) throw commissioningFault('pointsOff');
  return {
    points: { tripVolts: -trip.centre, releaseVolts: release.centre },
    noiseVolts: Math.max(trip.scatter, release.scatter),
  };
}

/** Returns where it tripped. A falling supply flips the lower it gets, so its position counts with the sign turned. */
async function creepDown(probe: ReferenceProbe, about: Thresholds, flips: Flip[]): Promise<number> {
  await comeClose((before) => probe.armOn(about, about.tripVolts + before, about.tripVolts + before / 2));
  for (let creep = 0; creep < mostCreeps && probe.isOn; creep++) {
    await probe.step(probe.volts - creepVolts);
    flips.push({ at: -probe.volts, flipped: !probe.isOn });
  }
  if (probe.isOn) throw commissioningFault('pointsOff');
  return probe.volts;
}

async function creepUp(probe: ReferenceProbe, about: Thresholds, flips: Flip[]): Promise<number> {
  await comeClose((before) => probe.armOff(about, about.releaseVolts - before, about.releaseVolts - before / 2));
  for (let creep = 0; creep < mostCreeps && !probe.isOn; creep++) {
    await probe.step(probe.volts + creepVolts);
    flips.push({ at: probe.volts, flipped: probe.isOn });
  }
  if (!probe.isOn) throw commissioningFault('pointsOff');
  return probe.volts;
}

async function comeClose(arm: (beforeVolts: number) => Promise<boolean>): Promise<void> {
  for (const before of startsBeforeVolts) if (await arm(before)) return;
  throw commissioningFault('flippedEarly');
}
