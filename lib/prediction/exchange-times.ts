/**
 * How long an instrument takes for what a station asks, from the characters on the line: ten bits a character, the
 * instrument's turn-around, and what the measurement itself takes. Lengths are those of plain SCPI-1999 with the error
 * query behind each command; a test compares them with the simulated station's. Milliseconds.
 */
export interface MeterRelays {
  channel: number | null;
  cycles: number | null;
}

const turnaroundMs = 0.7;
const supplyMeasureMs = 1;
/** The longest power-line period, 50 Hz. */
export const cycleMs = 20;
const relaySettleMs = 12;
/** Integration of a value that is kept, and of one that only tells on from off. */
export const valueCycles = 1;
export const stateCycles = 0.1;

/** Characters with their line's end. A command carries ";:SYST:ERR?" and is answered by 0,"No error". */
const errorQuery = 11;
const noError = 13;
const lengths = {
  setVolts: 12,
  setAmps: 11,
  setOvervoltage: 16,
  switchOn: 7,
  switchOff: 8,
  clear: 4,
  complete: 5,
  configure: 12,
  integration: 20,
  closeChannel: 16,
  read: 5,
  reading: 16,
  measureSupply: 10,
  supplyReading: 13,
  lid: 8,
  board: 9,
  pulseWidth: 23,
  trigger: 4,
  achieved: 20,
  achievedReading: 14,
};

export class ExchangeTimes {
  private readonly byteMs: number;

  constructor(baudRate: number) {
    this.byteMs = 10_000 / baudRate;
  }

  get setVoltsMs(): number {
    return this.command(lengths.setVolts);
  }

  /** Set and switch on. */
  get switchOnMs(): number {
    return this.setVoltsMs + this.command(lengths.switchOn);
  }

  /** Until the supply has taken it in; nothing answers. */
  get switchOffMs(): number {
    return this.send(lengths.switchOff);
  }

  get supplyAmpsMs(): number {
    return this.query(lengths.measureSupply, lengths.supplyReading) + supplyMeasureMs;
  }

  /** From the reading to its last character. */
  get supplyAnswerMs(): number {
    return lengths.supplyReading * this.byteMs;
  }
  get meterAnswerMs(): number {
    return lengths.reading * this.byteMs;
  }

  /** Lid and board. */
  get fixtureMs(): number {
    return this.query(lengths.lid, 2) + this.query(lengths.board, 2);
  }

  /** Protection and current limit of the supply, then the meter's configuration. */
  get prepareMs(): number {
    const { clear, complete, switchOff, setAmps, setOvervoltage, configure } = lengths;
    const reset = 2 * this.command(clear) + this.query(complete, 2);
    const supply = this.send(switchOff) + reset + this.command(switchOff);
    return supply + this.command(setAmps) + this.command(setOvervoltage) + reset + this.command(configure);
  }

  pulseMs(seconds: number): number {
    const { pulseWidth, trigger, achieved, achievedReading } = lengths;
    // The pulse begins while the trigger is still being answered.
    const left = Math.max(0, seconds * 1000 - noError * this.byteMs - this.send(achieved));
    return this.command(pulseWidth) + this.command(trigger) + left + this.query(achieved, achievedReading);
  }

  /** One reading of the meter, and the relays as it leaves them. */
  read(relays: MeterRelays, channel: number, cycles: number): { ms: number; relays: MeterRelays } {
    let ms = this.query(lengths.read, lengths.reading) + cycles * cycleMs;
    if (relays.cycles !== cycles) ms += this.command(lengths.integration);
    if (relays.channel !== channel) ms += this.command(lengths.closeChannel) + relaySettleMs;
    return { ms, relays: { channel, cycles } };
  }

  /** Without an answer, until the instrument has taken it in. */
  private send(length: number): number {
    return (length + 1) * this.byteMs + turnaroundMs;
  }

  private query(length: number, answer: number): number {
    return this.send(length) + answer * this.byteMs;
  }

  private command(length: number): number {
    return this.query(length + errorQuery, noError);
  }
}
