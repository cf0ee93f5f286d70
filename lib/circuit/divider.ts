import type { BoardDesign } from './board-design';

type DividerParts = Pick<BoardDesign, 'trimmerOhms' | 'supplyEndOhms' | 'groundEndOhms' | 'feedbackOhms'>;

/** Conductances at the wiper, siemens: to the supply, to ground, to the output. `wiper` is the fraction from the ground end, 0 to 1. */
export interface WiperConductances {
  toSupply: number;
  toGround: number;
  feedback: number;
}

export function wiperConductances(parts: DividerParts, wiper: number): WiperConductances {
  return {
    toSupply: 1 / (parts.supplyEndOhms + (1 - wiper) * parts.trimmerOhms),
    toGround: 1 / (parts.groundEndOhms + wiper * parts.trimmerOhms),
    feedback: 1 / parts.feedbackOhms,
  };
}

/** End to end across the supply, ohms. */
export function dividerOhms(parts: DividerParts): number {
  return parts.supplyEndOhms + parts.trimmerOhms + parts.groundEndOhms;
}

/** The fraction from ground of the whole divider, end resistors included. */
export function dividerFraction(parts: DividerParts, wiper: number): number {
  return (parts.groundEndOhms + wiper * parts.trimmerOhms) / dividerOhms(parts);
}

/** The trimmer's own fraction for a fraction of the whole divider; outside 0 to 1 where the trimmer cannot reach it. */
export function wiperOfFraction(parts: DividerParts, fraction: number): number {
  return (fraction * dividerOhms(parts) - parts.groundEndOhms) / parts.trimmerOhms;
}
