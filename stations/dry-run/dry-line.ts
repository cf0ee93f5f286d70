import { formatQueuedError, scpiErrorTexts, type ScpiErrorCode } from '@/lib/scpi/queued-error';
import { InstrumentError, type InstrumentName } from '../instruments/instrument-error';
import { turnaroundMs } from '../simulation/scpi-instrument';
import type { DryClock } from './dry-clock';

const noErrorLength = formatQueuedError({ code: 0, message: scpiErrorTexts[0] }).length;
/** Sign, digit, point, decimals, exponent of two digits with its letter and sign. */
const nr3Length = (decimals: number) => decimals + 7;

/** A reading under way: its value is there once the clock has reached `doneAtMs`. */
interface Begun {
  value(): number;
  doneAtMs(): number;
}

/**
 * The time that messages and answers take between a station and an instrument, as SerialLink, ScpiSession and ScpiInstrument
 * take it: characters at the line's speed, the instrument's turn-around, the error query behind each command. A reading comes
 * back rounded as its text would be. No bytes travel.
 */
export class DryLine {
  private readonly byteMs: number;
  private busyUntilMs = 0;
  private sendingUntilMs = 0;

  constructor(
    private readonly instrument: InstrumentName,
    private readonly clock: DryClock,
    baudRate: number,
    private readonly nextError: string,
  ) {
    this.byteMs = 10_000 / baudRate;
  }

  /** `perform` returns the code of a refusal, or nothing. */
  command(message: string, perform: () => ScpiErrorCode | void): void {
    const { clock, nextError } = this;
    clock.advanceTo(this.takeIn(message.length + 2 + nextError.length));
    const code = perform();
    this.answer(noErrorLength);
    if (!code) return;
    clock.advanceTo(this.takeIn(nextError.length));
    this.answer(noErrorLength);
    throw new InstrumentError('instrument-error', this.instrument, `The ${this.instrument} refused ${message}.`, [
      { code, message: scpiErrorTexts[code] },
    ]);
  }

  /** `read` is called at the end of a measurement of `afterMs` that began at the time it is given. */
  reading(
    message: string,
    decimals: number,
    afterMs: number | (() => number),
    read: (fromMs: number) => number,
  ): number {
    const { clock } = this;
    const fromMs = this.takeIn(message.length);
    if (typeof afterMs === 'function') clock.advanceTo(fromMs);
    this.busyUntilMs = fromMs + (typeof afterMs === 'function' ? afterMs() : afterMs);
    clock.advanceTo(this.busyUntilMs);
    const value = read(fromMs);
    this.answer(nr3Length(decimals));
    return Number(value.toExponential(decimals));
  }

  /** The same beside what another instrument does meanwhile. */
  beginReading(message: string, decimals: number, afterMs: number, read: () => number): Begun {
    const { clock } = this;
    let value = NaN;
    this.busyUntilMs = this.takeIn(message.length) + afterMs;
    clock.after(this.busyUntilMs - clock.now(), () => {
      value = Number(read().toExponential(decimals));
      this.sendingUntilMs = this.answeredAt(nr3Length(decimals));
    });
    return {
      value: () => value,
      doneAtMs: () => this.sendingUntilMs,
    };
  }

  /** A switch, answered as 1 or 0. */
  flag(message: string, read: () => boolean): boolean {
    this.clock.advanceTo(this.takeIn(message.length));
    const value = read();
    this.answer(1);
    return value;
  }

  /** Sends what has no answer: the caller goes on, the instrument follows. */
  send(message: string, perform: () => void): void {
    this.clock.after(this.takeIn(message.length) - this.clock.now(), perform);
  }

  private takeIn(length: number): number {
    const startMs = Math.max(this.clock.now(), this.busyUntilMs);
    this.busyUntilMs = startMs + (length + 1) * this.byteMs + turnaroundMs;
    return this.busyUntilMs;
  }

  private answer(length: number): void {
    this.sendingUntilMs = this.answeredAt(length);
    this.clock.advanceTo(this.sendingUntilMs);
  }

  private answeredAt(length: number): number {
    return Math.max(this.clock.now(), this.sendingUntilMs) + (length + 1) * this.byteMs;
  }
}
