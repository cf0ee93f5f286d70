import { headerMatches } from '@/lib/scpi/header';
import { parseProgramMessage, type MessageUnit } from '@/lib/scpi/message';
import { formatQueuedError, scpiErrorTexts, type QueuedError, type ScpiErrorCode } from '@/lib/scpi/queued-error';
import type { Clock } from '../clock/clock';
import { LineSplitter } from '../link/line-splitter';

/** A command's effect: nothing, an answer, or an answer that takes its time. */
export type Effect = void | string | { afterMs: number; answer: () => string };
export type CommandTable = Record<string, (parameters: string[]) => Effect>;

/** What a test or a trainer may do to the next answers. */
export interface AnswerFault {
  kind: 'silent' | 'late' | 'garbled' | 'cut-short';
  /** How many answers are spoilt. */
  count: number;
  lateMs?: number;
}

const queueLength = 20;
/** From the last character of a message to its execution. */
export const turnaroundMs = 0.7;

/** Thrown by a command's handler to put a standard error into the queue. */
export class Refusal extends Error {
  constructor(readonly scpiCode: ScpiErrorCode) {
    super(scpiErrorTexts[scpiCode]);
  }
}

/**
 * An instrument at the far end of a serial line: takes bytes, executes message units in order and sends bytes back, both
 * at the line's baud rate. Errors go into a queue that keeps the oldest and ends with -350 when it overflows.
 */
export abstract class ScpiInstrument {
  protected abstract readonly commands: CommandTable;
  private readonly known = new Map<string, ((parameters: string[]) => Effect) | null>();
  private readonly errors: QueuedError[] = [];
  private readonly lines = new LineSplitter((line) => this.hear(line));
  private sendBytes: (bytes: Buffer) => void = () => undefined;
  private byteMs = 0;
  private busyUntilMs = 0;
  private sendingUntilMs = 0;
  private fault: AnswerFault | null = null;

  constructor(
    protected readonly clock: Clock,
    private readonly identity: string,
  ) {}

  /** Joins it to a line. `baudRate` null: the line itself takes the time. */
  attach(send: (bytes: Buffer) => void, baudRate: number | null): void {
    this.sendBytes = send;
    this.byteMs = baudRate === null ? 0 : 10_000 / baudRate;
    this.busyUntilMs = 0;
    this.sendingUntilMs = 0;
    this.lines.clear();
  }

  receive(bytes: Buffer): void {
    this.lines.push(bytes);
  }

  spoil(fault: AnswerFault | null): void {
    this.fault = fault && { ...fault };
  }

  /** Bytes that nobody asked for, such as a disturbed line brings. */
  babble(bytes: Buffer): void {
    this.sendBytes(bytes);
  }

  protected reset(): void {
    this.errors.length = 0;
  }

  protected pushError(code: ScpiErrorCode): void {
    if (this.errors.length < queueLength) this.errors.push({ code, message: scpiErrorTexts[code] });
    else this.errors[queueLength - 1] = { code: -350, message: scpiErrorTexts[-350] };
  }

  private hear(line: string | null): void {
    const length = line === null ? 1 : line.length + 1;
    const startMs = Math.max(this.clock.now(), this.busyUntilMs);
    this.busyUntilMs = startMs + length * this.byteMs + turnaroundMs;
    this.clock.after(this.busyUntilMs - this.clock.now(), () => {
      if (line === null) this.pushError(-101);
      else this.execute(parseProgramMessage(line), 0, []);
    });
  }

  private execute(units: MessageUnit[], from: number, answers: string[]): void {
    for (let i = from; i < units.length; i++) {
      const effect = this.executeUnit(units[i]!);
      if (effect === undefined) continue;
      if (typeof effect === 'string') {
        answers.push(effect);
        continue;
      }
      this.busyUntilMs = Math.max(this.busyUntilMs, this.clock.now() + effect.afterMs);
      this.clock.after(effect.afterMs, () => {
        answers.push(effect.answer());
        this.execute(units, i + 1, answers);
      });
      return;
    }
    if (answers.length > 0) this.answer(answers.join(';'));
  }

  private executeUnit({ header, parameters }: MessageUnit): Effect {
    const command = this.find(header);
    if (!command) return this.pushError(-113);
    try {
      return command(parameters);
    } catch (error) {
      if (!(error instanceof Refusal)) throw error;
      this.pushError(error.scpiCode);
    }
  }

  private answer(text: string): void {
    const fault = this.fault;
    if (fault && --fault.count <= 0) this.fault = null;
    if (fault?.kind === 'silent') return;
    const bytes = fault ? spoilt(text, fault) : Buffer.from(`${text}\n`, 'latin1');
    // An instrument answers in order: what comes after a late answer is late too.
    const startMs = Math.max(this.clock.now(), this.sendingUntilMs) + (fault?.lateMs ?? 0);
    this.sendingUntilMs = startMs + bytes.length * this.byteMs;
    const { sendBytes } = this;
    this.clock.after(this.sendingUntilMs - this.clock.now(), () => sendBytes(bytes));
  }

  private find(header: string): ((parameters: string[]) => Effect) | null {
    const cached = this.known.get(header);
    if (cached !== undefined) return cached;
    const table = { ...this.commonCommands, ...this.commands };
    const pattern = Object.keys(table).find((candidate) => headerMatches(candidate, header));
    const command = pattern === undefined ? null : table[pattern]!;
    this.known.set(header, command);
    return command;
  }

  private readonly commonCommands: CommandTable = {
    '*IDN?': () => this.identity,
    '*RST': () => this.reset(),
    '*CLS': () => {
      this.errors.length = 0;
    },
    '*OPC?': () => '1',
    'SYSTem:ERRor[:NEXT]?': () => formatQueuedError(this.errors.shift() ?? { code: 0, message: scpiErrorTexts[0] }),
  };
}

function spoilt(text: string, fault: AnswerFault): Buffer {
  if (fault.kind === 'cut-short') return Buffer.from(text.slice(0, text.length >> 1), 'latin1');
  const bytes = Buffer.from(`${text}\n`, 'latin1');
  if (fault.kind === 'garbled') for (let i = 0; i < bytes.length - 1; i += 2) bytes[i]! |= 0x80;
  return bytes;
}
