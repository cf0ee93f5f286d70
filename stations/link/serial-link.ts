import { SerialPortStream } from '@serialport/stream';
import type { Clock } from '../clock/clock';
import { InstrumentError, type InstrumentErrorCode, type InstrumentName } from '../instruments/instrument-error';
import type { Binding } from './binding';
import { LineSplitter } from './line-splitter';
import type { SyncRequest, SyncWords } from './sync-words';

export interface LinkOptions {
  instrument: InstrumentName;
  path: string;
  baudRate: number;
  binding: Binding;
  clock: Clock;
  sync: SyncWords;
  /** What ends a line sent. A received line may end with either. */
  terminator: '\n' | '\r\n';
  /** Waits before each attempt to reopen after an unplug; after the last one the link is lost. */
  reopenDelaysMs?: readonly number[];
}

export type LinkState = 'closed' | 'open' | 'reopening' | 'lost';

interface Pending {
  onLine(line: string | null): void;
  fail(error: InstrumentError): void;
}

const defaultReopenDelaysMs = [200, 300, 500, 1000, 1000, 2000, 2000, 3000];
const syncAttempts = 3;
const syncDeadlineMs = 1000;
const quietMs = 20;
/** How long after an unanswered request its answer is still expected to come. */
const lateMs = 10_000;

/**
 * Lines over a serial port, one exchange at a time, each with a deadline. After a missing, broken or unasked answer
 * nothing more is believed until the instrument has answered a request whose answer no earlier one can be taken for, so
 * a late reply never becomes the answer to another command. After an unplug it tries to reopen, a bounded number of times.
 */
export class SerialLink {
  private port: SerialPortStream | null = null;
  private pending: Pending | null = null;
  private queue: Promise<unknown> = Promise.resolve();
  private suspect = true;
  private syncNumber = 0;
  private unanswered: { request: SyncRequest; untilMs: number } | null = null;
  private current: LinkState = 'closed';
  private readonly lines = new LineSplitter((line) => this.hear(line));
  private readonly watchers = new Set<(state: LinkState) => void>();

  constructor(private readonly options: LinkOptions) {}

  get state(): LinkState {
    return this.current;
  }

  get baudRate(): number {
    return this.options.baudRate;
  }

  get instrument(): InstrumentName {
    return this.options.instrument;
  }

  /** Calls back on every change of state; returns how to stop. */
  watch(watcher: (state: LinkState) => void): () => void {
    this.watchers.add(watcher);
    return () => this.watchers.delete(watcher);
  }

  /** Rejects with `link-lost` and is lost when the port cannot be opened; may be tried again. */
  async open(): Promise<void> {
    try {
      await this.openPort();
    } catch (error) {
      this.become('lost');
      throw error;
    }
    this.become('open');
  }

  /** Sends a line and resolves with the line that answers it. */
  exchange(message: string, deadlineMs: number): Promise<string> {
    return this.inTurn(async () => {
      // Half a line means that the rest of something late is still on its way.
      if (this.lines.clear() || this.suspect) await this.synchronise();
      return this.transfer(
        message,
        deadlineMs,
        () => true,
        (line) => this.isLate(line, message),
      );
    });
  }

  /** Sends a line that has no answer, even where the last answers cannot be believed. */
  send(message: string): Promise<void> {
    return this.inTurn(() => this.write(message));
  }

  /** Tells the link that an answer was not of the form that was asked for. */
  distrust(): void {
    this.suspect = true;
  }

  async close(): Promise<void> {
    const { port } = this;
    this.become('closed');
    this.port = null;
    this.pending?.fail(this.error('link-closed', 'was closed.'));
    if (port?.isOpen) await new Promise<void>((resolve) => port.close(() => resolve()));
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const turn = this.queue.then(work);
    this.queue = turn.catch(() => undefined);
    return turn;
  }

  /** An answer to a request to synchronise that went unanswered may come after a later one was believed. */
  private isLate(line: string, asked: string): boolean {
    const { unanswered } = this;
    if (!unanswered || this.options.clock.now() > unanswered.untilMs) return false;
    return unanswered.request.couldBeLate?.(line, asked) ?? false;
  }

  private async transfer(
    message: string,
    deadlineMs: number,
    isAnswer: (line: string) => boolean,
    isLate: (line: string) => boolean = () => false,
  ): Promise<string> {
    const { clock } = this.options;
    return new Promise<string>((resolve, reject) => {
      const cancel = clock.after(deadlineMs, () =>
        finish(() => reject(this.doubt('instrument-timeout', `did not answer within ${Math.round(deadlineMs)} ms.`))),
      );
      const finish = (settle: () => void) => {
        this.pending = null;
        cancel();
        settle();
      };
      this.pending = {
        onLine: (line) => {
          if (line === null) finish(() => reject(this.doubt('instrument-garbled', 'sent bytes that are no text.')));
          else if (isLate(line))
            finish(() => reject(this.doubt('instrument-garbled', 'answered an earlier question, late.')));
          else if (isAnswer(line)) finish(() => resolve(line));
        },
        fail: (error) => finish(() => reject(error)),
      };
      this.write(message).catch((error: InstrumentError) => this.pending?.fail(error));
    });
  }

  private write(message: string): Promise<void> {
    const { port } = this;
    if (this.current !== 'open' || !port?.isOpen) return Promise.reject(this.lost());
    return new Promise((resolve, reject) => {
      port.write(message + this.options.terminator, 'latin1', (error) => (error ? reject(this.lost()) : resolve()));
    });
  }

  private async synchronise(): Promise<void> {
    let failure: unknown;
    for (let attempt = 0; attempt < syncAttempts; attempt++) {
      const request = this.options.sync(this.syncNumber++);
      this.lines.clear();
      try {
        await this.transfer(request.message, syncDeadlineMs, request.isAnswer);
        this.suspect = false;
        // Whatever still comes was not asked for and makes the link suspect again.
        await this.options.clock.sleep(quietMs);
        if (!this.suspect && !this.lines.clear()) return;
      } catch (error) {
        failure = error;
        this.unanswered = { request, untilMs: this.options.clock.now() + lateMs };
        if (this.current !== 'open') break;
      }
    }
    this.suspect = true;
    throw failure ?? this.doubt('instrument-garbled', 'keeps sending what nobody asked for.');
  }

  private hear(line: string | null): void {
    if (this.pending) this.pending.onLine(line);
    else this.suspect = true;
  }

  private async openPort(): Promise<void> {
    const { binding, path, baudRate } = this.options;
    const port = new SerialPortStream({ binding, path, baudRate, autoOpen: false });
    await new Promise<void>((resolve, reject) => {
      port.open((error) =>
        error ? reject(this.error('link-lost', `cannot be reached: ${error.message}.`)) : resolve(),
      );
    });
    this.suspect = true;
    this.lines.clear();
    port.on('data', (bytes: Buffer) => this.lines.push(bytes));
    // A failed write or read also closes the port; what matters is told by 'close'.
    port.on('error', () => undefined);
    port.once('close', () => this.unplugged(port));
    this.port = port;
  }

  private unplugged(port: SerialPortStream): void {
    if (this.port !== port) return;
    this.port = null;
    this.become('reopening');
    this.pending?.fail(this.lost());
    void this.reopen();
  }

  private async reopen(): Promise<void> {
    for (const delayMs of this.options.reopenDelaysMs ?? defaultReopenDelaysMs) {
      await this.options.clock.sleep(delayMs);
      if (this.current !== 'reopening') return;
      try {
        await this.openPort();
      } catch {
        continue;
      }
      if (this.current !== 'reopening') return this.close();
      return this.become('open');
    }
    this.become('lost');
  }

  private become(state: LinkState): void {
    if (state === this.current) return;
    this.current = state;
    for (const watcher of this.watchers) watcher(state);
  }

  private lost(): InstrumentError {
    return this.current === 'closed'
      ? this.error('link-closed', 'is not open.')
      : this.error('link-lost', 'is no longer connected. Check its cable and that it is switched on.');
  }

  private doubt(code: InstrumentErrorCode, predicate: string): InstrumentError {
    this.suspect = true;
    return this.error(code, predicate);
  }

  private error(code: InstrumentErrorCode, predicate: string): InstrumentError {
    return new InstrumentError(code, this.options.instrument, `The ${this.options.instrument} ${predicate}`);
  }
}
