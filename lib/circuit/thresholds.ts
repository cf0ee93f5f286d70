import type { BoardDesign } from './board-design';
import { wiperConductances } from './divider';

export interface Thresholds {
  tripVolts: number;
  releaseVolts: number;
}

/**
 * Trip and release for a known reference voltage, closed form (superposition at the wiper):
 *
 *   trip    = [Vz (G1+G2+Gf) + Vd Gf] / (G1+Gf)
 *   release = [Vz (G1+G2+Gf) - VOL Gf] / G1
 *
 * A comparator's offset is added to Vz.
 */
export function thresholdsAt(design: BoardDesign, wiper: number, referenceVolts: number): Thresholds {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const atWiper = (referenceVolts + (design.comparatorOffsetVolts ?? 0)) * (toSupply + toGround + feedback);
  return {
    tripVolts: (atWiper + design.outputDropVolts * feedback) / (toSupply + feedback),
    releaseVolts: (atWiper - design.outputLowVolts * feedback) / toSupply,
  };
}

/** Volts per unit of wiper travel at a constant reference, both negative: the wiper towards the supply lowers both points. */
export interface ThresholdSlopes {
  tripVoltsPerTravel: number;
  releaseVoltsPerTravel: number;
}

export function thresholdSlopes(design: BoardDesign, wiper: number, referenceVolts: number): ThresholdSlopes {
  const { toSupply, toGround, feedback } = wiperConductances(design, wiper);
  const supplySlope = design.trimmerOhms * toSupply ** 2;
  const groundSlope = -design.trimmerOhms * toGround ** 2;
  const { tripVolts, releaseVolts } = thresholdsAt(design, wiper, referenceVolts);
  const atWiper = (referenceVolts + (design.comparatorOffsetVolts ?? 0)) * (supplySlope + groundSlope);
  return {
    tripVoltsPerTravel: (atWiper - tripVolts * supplySlope) / (toSupply + feedback),
    releaseVoltsPerTravel: (atWiper - releaseVolts * supplySlope) / toSupply,
  };
}
