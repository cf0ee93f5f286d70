import type { BoardDesign } from '../board-design';
import { wiperConductances } from '../divider';

type Reference = BoardDesign['reference'];

const mostSteps = 60;
const toleranceVolts = 1e-9;

/** The reference node at a supply voltage; as referenceAt, by Newton's method from above. */
export function nodeAt(reference: Reference, supplyVolts: number): number {
  const { nominalVolts, ratedAmps, kneeVolts, feedOhms } = reference;
  const feedVolts = feedOhms * ratedAmps;
  let node = Math.min(supplyVolts, nominalVolts + kneeVolts * Math.log(supplyVolts / feedVolts));
  for (let step = 0; step < mostSteps; step++) {
    const dropped = feedVolts * Math.exp((node - nominalVolts) / kneeVolts);
    const moved = (node + dropped - supplyVolts) / (1 + dropped / kneeVolts);
    node -= moved;
    if (Math.abs(moved) < toleranceVolts) return node;
  }
  return node;
}

/** The reference nodes at trip and at release, as softKneeThresholds finds them but from nodes nearby. NaN where there is none. */
export function nodesNear(
  design: BoardDesign,
  wiper: number,
  nearTripVolts: number,
  nearReleaseVolts: number,
): { trip: number; release: number } {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const total = toSupply + toGround + feedback;
  const offset = total * (design.comparatorOffsetVolts ?? 0);
  const low = toSupply + feedback;
  const { reference, outputDropVolts, outputLowVolts } = design;
  return {
    trip: crossingNear(reference, total / low, (offset + outputDropVolts * feedback) / low, nearTripVolts),
    release: crossingNear(
      reference,
      total / toSupply,
      (offset - outputLowVolts * feedback) / toSupply,
      nearReleaseVolts,
    ),
  };
}

/**
 * Where `slope` V + `offset` meets the supply that the node needs, by Newton's method. The difference is concave, so that
 * every step but the first approaches from above.
 */
function crossingNear(reference: Reference, slope: number, offset: number, nearVolts: number): number {
  const { nominalVolts, ratedAmps, kneeVolts, feedOhms } = reference;
  const feedVolts = feedOhms * ratedAmps;
  const top = nominalVolts + kneeVolts * Math.log(((slope - 1) * kneeVolts) / feedVolts);
  const unheld = (slope - 1) * top + offset;
  if (!(unheld > (slope - 1) * kneeVolts)) return NaN;
  // Just below the crossing: there the zener's current is what it would be if the left side stood still.
  let node = Math.max(nearVolts, nominalVolts + kneeVolts * Math.log(unheld / feedVolts));
  for (let step = 0; step < mostSteps; step++) {
    const dropped = feedVolts * Math.exp((node - nominalVolts) / kneeVolts);
    const moved = ((slope - 1) * node + offset - dropped) / (slope - 1 - dropped / kneeVolts);
    node -= moved;
    if (Math.abs(moved) < toleranceVolts) return node;
  }
  return NaN;
}
