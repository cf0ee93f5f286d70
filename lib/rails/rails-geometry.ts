import type { BenchReading, RailsView } from '../contracts/bench-view';

/** Lengths of the rails in pixels of the bench drawing; the svg scales as a whole. */
export const railsBox = {
  width: 667,
  height: 734,
  /** Centre lines of the two tubes. */
  tripX: 224,
  releaseX: 460,
  tube: 28,
  radius: 57,
  /** Both ends of the straight part, where the scale's ends lie. */
  topY: 174,
  bottomY: 642,
  jawLength: 48,
  jawHeight: 22,
} as const;

export const tubeEdge = railsBox.tube / 2;

/** Height of a voltage on the scale; beyond its ends the straight part's ends. */
export function heightOf({ scaleMinVolts, scaleMaxVolts }: RailsView, volts: number): number {
  const { topY, bottomY } = railsBox;
  const share = (scaleMaxVolts - volts) / (scaleMaxVolts - scaleMinVolts);
  return topY + Math.min(1, Math.max(0, share)) * (bottomY - topY);
}

/** Step between ticks: every one, the longer ones and the numbered ones. Volts. */
export function tickSteps(spanVolts: number): { minor: number; middle: number; major: number } {
  const choices = [
    { minor: 0.02, middle: 0.1, major: 0.2 },
    { minor: 0.05, middle: 0.1, major: 0.5 },
    { minor: 0.1, middle: 0.5, major: 1 },
    { minor: 0.2, middle: 1, major: 2 },
    { minor: 0.5, middle: 1, major: 5 },
    { minor: 1, middle: 5, major: 10 },
  ];
  return choices.find(({ minor }) => spanVolts / minor <= 45) ?? choices.at(-1)!;
}

export interface ScaleTick {
  volts: number;
  rank: 'minor' | 'middle' | 'major';
}

/** Every tick between both ends, from the top down. */
export function scaleTicks(minVolts: number, maxVolts: number): ScaleTick[] {
  const { minor, middle, major } = tickSteps(maxVolts - minVolts);
  const isMultiple = (volts: number, step: number) => Math.abs(volts / step - Math.round(volts / step)) < 1e-6;
  const ticks: ScaleTick[] = [];
  for (let i = Math.floor(maxVolts / minor + 1e-6); i * minor >= minVolts - 1e-9; i--) {
    const volts = i * minor;
    ticks.push({
      volts,
      rank: isMultiple(volts, major) ? 'major' : isMultiple(volts, middle) ? 'middle' : 'minor',
    });
  }
  return ticks;
}

/** Where the ringed dot of the live supply sits, or null while the supply is off. Beyond the scale it waits on the bends. */
export function dotPosition(rails: RailsView, reading: BenchReading): { x: number; y: number } | null {
  if (reading.rail === 'off') return null;
  const { tripX, releaseX, topY, bottomY, radius } = railsBox;
  const middle = (tripX + releaseX) / 2;
  if (reading.volts > rails.scaleMaxVolts) return { x: middle, y: topY - radius };
  if (reading.volts < rails.scaleMinVolts) return { x: middle, y: bottomY + radius };
  return { x: reading.rail === 'falling' ? tripX : releaseX, y: heightOf(rails, reading.volts) };
}

const { tripX, releaseX, topY, bottomY, radius } = railsBox;

/** Paths of the tubes. */
export const tubePaths = {
  loop: `M${tripX} ${topY}V${bottomY}a${radius} ${radius} 0 0 0 ${radius} ${radius}H${releaseX - radius}a${radius} ${radius} 0 0 0 ${radius} ${-radius}V${topY}a${radius} ${radius} 0 0 0 ${-radius} ${-radius}H${tripX + radius}a${radius} ${radius} 0 0 0 ${-radius} ${radius}Z`,
  top: `M${releaseX} ${topY}a${radius} ${radius} 0 0 0 ${-radius} ${-radius}H${tripX + radius}a${radius} ${radius} 0 0 0 ${-radius} ${radius}`,
  bottom: `M${tripX} ${bottomY}a${radius} ${radius} 0 0 0 ${radius} ${radius}H${releaseX - radius}a${radius} ${radius} 0 0 0 ${radius} ${-radius}`,
  straight: (side: 'trip' | 'release', fromY: number, toY: number) =>
    `M${side === 'trip' ? tripX : releaseX} ${fromY}V${toY}`,
} as const;
