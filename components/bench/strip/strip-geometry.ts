/** The magnified strip in pixels of the bench drawing: 413 wide, as high as the rails beside it. */
export const stripBox = { width: 413, height: 734, tubeX: 181, tube: 46, topY: 86, bottomY: 660 } as const;

export interface StripWindow {
  minVolts: number;
  maxVolts: number;
  tickVolts: number;
}

/** A window around the target, 0.1 V or the next round width that shows the whole tolerance; about fifty ticks. */
export function stripWindow(targetVolts: number, toleranceVolts: number): StripWindow {
  const width = [0.1, 0.2, 0.5, 1].find((w) => w >= toleranceVolts * 4) ?? toleranceVolts * 5;
  return {
    minVolts: targetVolts - width / 2,
    maxVolts: targetVolts + width / 2,
    tickVolts: width / 50,
  };
}

export function stripHeight({ minVolts, maxVolts }: StripWindow, volts: number): number {
  const share = (maxVolts - volts) / (maxVolts - minVolts);
  return stripBox.topY + Math.min(1, Math.max(0, share)) * (stripBox.bottomY - stripBox.topY);
}

/** Zigzag of a cut end across the tube. */
export function zigzag(y: number): string {
  const { tubeX, tube } = stripBox;
  const points = [-34, -20, -10, 0, 10, 20, 34].map((dx, i) => `${tubeX + (dx * tube) / 46} ${y + (i % 2 ? 11 : 0)}`);
  return `M${points.join('L')}`;
}
