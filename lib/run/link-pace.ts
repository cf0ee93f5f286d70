const fastFromBaud = 57_600;

/** Fast enough to follow a hand that turns. */
export const isFastLink = (baudRate: number) => baudRate >= fastFromBaud;

/** One poll of the output: about 90 characters both ways, ten bits each, and the instrument's own time. */
export function pollMsAt(baudRate: number): number {
  return Math.round(25 + (90 * 10_000) / baudRate);
}
