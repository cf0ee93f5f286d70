/** Turns between two directions of a hand around a knob, by the shorter way. Positive is clockwise; angles in radians. */
export function turnsBetween(fromRadians: number, toRadians: number): number {
  const turns = (toRadians - fromRadians) / (2 * Math.PI);
  return turns - Math.round(turns);
}

/** Turns of one press of a key; null for other keys. */
export function turnsOfKey(key: string): number | null {
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return 5 / 360;
    case 'ArrowLeft':
    case 'ArrowDown':
      return -5 / 360;
    case 'PageUp':
      return 1;
    case 'PageDown':
      return -1;
    case '+':
      return 1 / 360;
    case '-':
      return -1 / 360;
    default:
      return null;
  }
}

/** One notch of a wheel is ten degrees. */
export const turnsOfWheel = (deltaY: number) => -Math.sign(deltaY) * (10 / 360);
