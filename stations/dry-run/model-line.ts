import type { Clock } from '../clock/clock';
import { turnaroundMs } from '../simulation/scpi-instrument';

/** What an instrument does with a message: at once, or after a measurement that began at `fromMs`. */
export interface Work<T> {
  /** How long the measurement takes once the message is executed; asked then. */
  afterMs?(): number;
  perform(fromMs: number): T;
}

/**
 * The time that messages and answers take between a station and an instrument, as SerialLink and ScpiInstrument take it:
 * characters at the line's speed, the instrument's own turn-around, one exchange at a time. No bytes travel.
 */
export class ModelLine {
  private turn: Promise<unknown> = Promise.resolve();
  private readonly byteMs: number;
  private busyUntilMs = 0;
  private sendingUntilMs = 0;

  constructor(
    private readonly clock: Clock,
    baudRate: number,
  ) {
    this.byteMs = 10_000 / baudRate;
  }

  /** Resolves with what came of the work once its answer is here. Lengths in characters, without the line's end. */
  exchange<T>(sentLength: number, answerLength: number, work: Work<T>): Promise<T> {
    return this.inTurn(async () => {
      const { clock } = this;
      const untilMs = this.takeIn(sentLength);
      const afterMs = work.afterMs;
      await clock.sleep(untilMs - clock.now());
      const fromMs = clock.now();
      if (afterMs) {
        const ownMs = afterMs();
        this.busyUntilMs = Math.max(this.busyUntilMs, fromMs + ownMs);
        await clock.sleep(ownMs);
      }
      const done = work.perform(fromMs);
      this.sendingUntilMs = Math.max(clock.now(), this.sendingUntilMs) + (answerLength + 1) * this.byteMs;
      await clock.sleep(this.sendingUntilMs - clock.now());
      return done;
    });
  }

  /** Sends what has no answer: the caller goes on, the instrument follows. */
  send(sentLength: number, perform: () => void): Promise<void> {
    return this.inTurn(async () => {
      this.clock.after(this.takeIn(sentLength) - this.clock.now(), perform);
    });
  }

  private takeIn(length: number): number {
    const startMs = Math.max(this.clock.now(), this.busyUntilMs);
    this.busyUntilMs = startMs + (length + 1) * this.byteMs + turnaroundMs;
    return this.busyUntilMs;
  }

  private inTurn<T>(work: () => Promise<T>): Promise<T> {
    const turn = this.turn.then(work);
    this.turn = turn.catch(() => undefined);
    return turn;
  }
}
