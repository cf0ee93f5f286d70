/** A programmable supply with remote sense. What it does, not how bytes travel. Errors carry a `code` from `instrument-error.ts`. */
export interface Supply {
  identify(): Promise<string>;
  /** Resets, clears errors, output off; then current limit and overvoltage protection, in that order. Amperes, volts. */
  prepare(limits: { currentLimitAmps: number; overvoltageVolts: number }): Promise<void>;
  setVolts(volts: number): Promise<void>;
  switchOn(): Promise<void>;
  /** Sends the off command even when earlier commands failed. Says nothing about success: read back. */
  switchOff(): Promise<void>;
  /** At the remote sense terminals, volts. */
  measureVolts(): Promise<number>;
  measureAmps(): Promise<number>;
  overvoltageTripped(): Promise<boolean>;
  clearOvervoltage(): Promise<void>;
  /** Drains the error queue; empty when there is none. */
  readErrors(): Promise<{ code: number; message: string }[]>;
}
