import type { Cancel, Clock } from './clock';
import { sleepOn } from './sleep-on';
import { TimerQueue } from './timer-queue';

/**
 * Discrete-event time: jumps to the next timer once nothing else is runnable. Promises and `nextTick` (all that streams
 * and the mock binding use) drain before a `setImmediate` turn, so two quiet turns mean that everyone waits for time.
 * Timers of one instant fire one by one in the order they were set: the same program gives the same history.
 */
export class VirtualClock implements Clock {
  private nowMs = 0;
  private quietTurns = 0;
  private pumping = false;
  private holds = 0;
  private readonly timers = new TimerQueue();

  constructor(private readonly options: { startWallMs: number; idleTurns: number } = defaults) {}

  now(): number {
    return this.nowMs;
  }

  wallTimeMs(): number {
    return this.options.startWallMs + this.nowMs;
  }

  after(ms: number, run: () => void): Cancel {
    const cancel = this.timers.add(this.nowMs + Math.max(0, ms), run);
    this.quietTurns = 0;
    this.pump();
    return cancel;
  }

  sleep(ms: number, signal?: AbortSignal): Promise<void> {
    return sleepOn((delay, run) => this.after(delay, run), ms, signal);
  }

  /** Keeps time still while something outside is awaited, such as a database. */
  async standStill<T>(work: Promise<T>): Promise<T> {
    this.holds++;
    try {
      return await work;
    } finally {
      this.holds--;
      this.quietTurns = 0;
      this.pump();
    }
  }

  private pump(): void {
    if (this.pumping || this.holds > 0 || this.timers.size === 0) return;
    this.pumping = true;
    setImmediate(this.turn);
  }

  private readonly turn = (): void => {
    this.pumping = false;
    if (this.holds > 0) return;
    if (++this.quietTurns >= this.options.idleTurns) {
      const timer = this.timers.pop();
      if (timer) {
        this.nowMs = timer.atMs;
        this.quietTurns = 0;
        timer.run();
      }
    }
    this.pump();
  };
}

const defaults = { startWallMs: Date.UTC(2026, 0, 5, 6), idleTurns: 2 };
