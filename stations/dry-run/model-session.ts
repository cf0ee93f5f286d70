import { formatQueuedError, scpiErrorTexts, type ScpiErrorCode } from '@/lib/scpi/queued-error';
import { InstrumentError, type InstrumentName } from '../instruments/instrument-error';
import type { ModelLine } from './model-line';

const noErrorLength = formatQueuedError({ code: 0, message: scpiErrorTexts[0] }).length;
/** Sign, digit, point, decimals, exponent of two digits with its sign and letter. */
const nr3Length = (decimals: number) => decimals + 7;

/** Readings as they come back from their text: rounded to `decimals` of the mantissa. */
export const throughText = (value: number, decimals: number) => Number(value.toExponential(decimals));

/** What ScpiSession does, on a line without bytes: a command asks for the error queue in the same message. */
export class ModelSession {
  constructor(
    private readonly instrument: InstrumentName,
    private readonly line: ModelLine,
    private readonly nextError: string,
  ) {}

  /** `perform` returns the code of a refusal, or nothing. */
  async command(message: string, perform: () => ScpiErrorCode | void): Promise<void> {
    let code: ScpiErrorCode | void;
    const sentLength = message.length + 2 + this.nextError.length;
    // The error's text is longer than that of none; only a refused command is off by its milliseconds.
    await this.line.exchange(sentLength, noErrorLength, { perform: () => (code = perform()) });
    if (!code) return;
    await this.line.exchange(this.nextError.length, noErrorLength, { perform: () => undefined });
    const error = { code, message: scpiErrorTexts[code] };
    throw new InstrumentError(
      'instrument-error',
      this.instrument,
      `The ${this.instrument} refused ${message}: ${error.code} ${error.message}.`,
      [error],
    );
  }

  /** A number with so many decimals, read when the message is executed or `afterMs` later. */
  async reading(
    message: string,
    decimals: number,
    read: (fromMs: number) => number,
    afterMs?: () => number,
  ): Promise<number> {
    const value = await this.line.exchange(message.length, nr3Length(decimals), { perform: read, afterMs });
    return throughText(value, decimals);
  }

  /** A switch, answered as 1 or 0. */
  flag(message: string, read: () => boolean): Promise<boolean> {
    return this.line.exchange(message.length, 1, { perform: read });
  }

  send(message: string, perform: () => void): Promise<void> {
    return this.line.send(message.length, perform);
  }
}
