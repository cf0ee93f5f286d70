import type { Cancel, Clock } from './clock';
import { sleepOn } from './sleep-on';

interface Timer {
  atMs: number;
  order: number;
  run: () => void;
}

/**
 * Discrete-event time: jumps to the next timer once nothing else is runnable. Promises and `nextTick` (all that streams
 * and the mock binding use) drain before a `setImmediate` turn, so two quiet turns mean that everyone waits for time.
 * Timers of one instant fire one by one in the order they were set: the same program gives the same history.
 */
export class VirtualClock implements Clock {
  private nowMs = 0;
  private order = 0;
  private quietTurns = 0;
  private pumping = false;
  private holds = 0;
  /** Latest first, so that the next one is popped from the end. */
  private readonly timers: Timer[] = [];

  constructor(private readonly options: { startWallMs: number; idleTurns: number } = defaults) {}

  now(): number {
    return this.nowMs;
  }

  wallTimeMs(): number {
    return this.options.startWallMs + this.nowMs;
  }

  after(ms: number, run: () => void): Cancel {
    const timer: Timer = { atMs: this.nowMs + Math.max(0, ms), order: this.order++, run };
    this.timers.splice(this.indexOf(timer), 0, timer);
    this.quietTurns = 0;
    this.pump();
    return () => {
      const index = this.indexOf(timer);
      if (this.timers[index] === timer) this.timers.splice(index, 1);
    };
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

  /** Where `timer` stands, or belongs, in the order latest first. */
  private indexOf(timer: Timer): number {
    let low = 0;
    let high = this.timers.length;
    while (low < high) {
      const middle = (low + high) >> 1;
      const other = this.timers[middle]!;
      if (other.atMs > timer.atMs || (other.atMs === timer.atMs && other.order > timer.order)) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  private pump(): void {
    if (this.pumping || this.holds > 0 || this.timers.length === 0) return;
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
