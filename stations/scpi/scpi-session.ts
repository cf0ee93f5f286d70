import { parseScpiNumber } from '@/lib/scpi/number';
import { parseQueuedError, scpiErrorClass, type QueuedError } from '@/lib/scpi/queued-error';
import { InstrumentError, isInstrumentError } from '../instruments/instrument-error';
import type { SerialLink } from '../link/serial-link';

export interface SessionWords {
  /** Sent after every opening of the link, such as a remote-control command. */
  opening: readonly string[];
  /** Query for the oldest entry of the error queue. */
  nextError: string;
  /** Whether a command and the error query may share one message, which saves a turn-around. */
  compound: boolean;
  terminator: '\n' | '\r\n';
  deadlineMs: number;
}

const mostQueuedErrors = 30;

/** SCPI over a link: queries, and commands whose errors are read back at once. */
export class ScpiSession {
  private opening: Promise<void> | null = null;

  constructor(
    readonly link: SerialLink,
    readonly words: SessionWords,
  ) {
    link.watch((state) => {
      if (state !== 'open') this.opening = null;
    });
  }

  /** Bits on the wire included: ten a byte. */
  private deadlineFor(message: string, extraMs: number): number {
    return this.words.deadlineMs + extraMs + ((message.length + 80) * 10_000) / this.link.baudRate;
  }

  /** Asks and returns the answer's text. A broken answer is asked for once more. `extraMs`: what the measurement itself takes. */
  async query(message: string, extraMs = 0): Promise<string> {
    await this.openSession();
    try {
      return await this.link.exchange(message, this.deadlineFor(message, extraMs));
    } catch (error) {
      if (!isInstrumentError(error) || error.code !== 'instrument-garbled') throw error;
      return this.link.exchange(message, this.deadlineFor(message, extraMs));
    }
  }

  /** Asks for one finite number. */
  async queryNumber(message: string, extraMs = 0): Promise<number> {
    for (let attempt = 0; ; attempt++) {
      const answer = await this.query(message, extraMs);
      const value = parseScpiNumber(answer);
      if (value === null) {
        this.link.distrust();
        if (attempt === 0) continue;
        throw this.error('instrument-garbled', `answered ${message} with something else.`);
      }
      if (!Number.isFinite(value)) throw this.error('reading-invalid', 'reports an overload instead of a reading.');
      return value;
    }
  }

  /** Sends a command and drains the error queue; any entry is an error. */
  async command(message: string): Promise<void> {
    await this.openSession();
    await this.commandOnly(message);
  }

  private async commandOnly(message: string): Promise<void> {
    const { nextError, compound } = this.words;
    if (!compound) await this.link.send(message);
    const queued = await this.drain(compound ? `${message};:${nextError}` : nextError);
    if (queued.length === 0) return;
    // A query error says that answers were dropped or mixed up.
    if (queued.some(({ code }) => scpiErrorClass(code) === 'query')) this.link.distrust();
    const texts = queued.map(({ code, message: text }) => `${code} ${text}`).join('; ');
    throw new InstrumentError(
      'instrument-error',
      this.link.instrument,
      `The ${this.link.instrument} refused ${message}: ${texts}.`,
      queued,
    );
  }

  /** Drains the error queue; empty when there is nothing in it. */
  async readErrors(): Promise<QueuedError[]> {
    await this.openSession();
    return this.drain(this.words.nextError);
  }

  /** A parser that gave up on the first unit of a message never sees the question behind it, so it is asked once more alone. */
  private async drain(firstMessage: string): Promise<QueuedError[]> {
    let next: QueuedError;
    try {
      next = await this.readError(firstMessage);
    } catch (error) {
      if (!isInstrumentError(error) || error.code !== 'instrument-timeout') throw error;
      next = await this.readError(this.words.nextError);
      if (next.code === 0) throw error;
    }
    const errors: QueuedError[] = [];
    while (next.code !== 0 && errors.length < mostQueuedErrors) {
      errors.push(next);
      next = await this.readError(this.words.nextError);
    }
    return errors;
  }

  private async readError(message: string): Promise<QueuedError> {
    const answer = await this.link.exchange(message, this.deadlineFor(message, 0));
    const error = parseQueuedError(answer);
    if (error) return error;
    this.link.distrust();
    throw this.error('instrument-garbled', 'did not answer with an error code when asked for one.');
  }

  private async openSession(): Promise<void> {
    const { opening } = this.words;
    if (opening.length === 0) return;
    this.opening ??= (async () => {
      for (const message of opening) await this.commandOnly(message);
    })();
    try {
      await this.opening;
    } catch (error) {
      this.opening = null;
      throw error;
    }
  }

  private error(code: 'instrument-garbled' | 'reading-invalid', predicate: string): InstrumentError {
    return new InstrumentError(code, this.link.instrument, `The ${this.link.instrument} ${predicate}`);
  }
}
