/** 101 the board's supply terminals, 102 its output, 103 its reference node, 104 the wiper where the fixture has that probe. */
export type Channel = 101 | 102 | 103 | 104;

/** A multimeter with scanner. */
export interface Multimeter {
  identify(): Promise<string>;
  prepare(): Promise<void>;
  /** Closes the relay, waits for it to settle, integrates and reads. Volts DC. Integration in power-line cycles. */
  readVolts(channel: Channel, integrationCycles: number): Promise<number>;
  readErrors(): Promise<{ code: number; message: string }[]>;
}
