/** Lid switch, board-present switch, and a series switch that interrupts the board's supply for a timed pulse. */
export interface FixtureController {
  identify(): Promise<string>;
  lidClosed(): Promise<boolean>;
  boardPresent(): Promise<boolean>;
  /** Interrupts the supply and returns the width achieved. Seconds in, seconds out. */
  interruptSupply(seconds: number): Promise<number>;
  readErrors(): Promise<{ code: number; message: string }[]>;
}
