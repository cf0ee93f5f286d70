import type { BoardDesign } from './board-design';
import { wiperConductances } from './divider';
import type { Thresholds } from './thresholds';

/**
 * Trip and release with a zener of knee voltage and slope resistance, Vz = Vk + rz I, fed from the supply through
 * `feedOhms`. With k = rz/(Rz+rz) and V0 = Vk Rz/(Rz+rz): trip = (S V0 + Vd Gf)/(G1+Gf - S k), release =
 * (S V0 - VOL Gf)/(G1 - S k), S = G1+G2+Gf. Good near one bias current; the soft knee holds over a range.
 */
export function linearZenerThresholds(
  design: BoardDesign,
  wiper: number,
  zener: { kneeVolts: number; slopeOhms: number },
): Thresholds {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const total = toSupply + toGround + feedback;
  const { feedOhms } = design.reference;
  const follow = zener.slopeOhms / (feedOhms + zener.slopeOhms);
  const unloaded = (zener.kneeVolts * feedOhms) / (feedOhms + zener.slopeOhms);
  return {
    tripVolts: (total * unloaded + design.outputDropVolts * feedback) / (toSupply + feedback - total * follow),
    releaseVolts: (total * unloaded - design.outputLowVolts * feedback) / (toSupply - total * follow),
  };
}
