import type { Cancel, Clock } from './clock';
import { sleepOn } from './sleep-on';
import { TimerQueue } from './timer-queue';

/** Real time that passes unseen in one piece, as when the machine is busy elsewhere, counts no more than this. */
const longestGapMs = 50;
/** Turns of the event loop that must be quiet before the next timer fires; see VirtualClock. */
const idleTurns = 2;

/**
 * Runs `factor` times faster than real time, and never ahead of the work: timers fire one by one in their order, each after
 * what the one before set going has drained, so that a busy machine makes it slower but no deadline pass early. Calendar
 * time stays real, since due dates are compared with it.
 */
export class ScaledClock implements Clock {
  private nowMs = 0;
  /** Time may pass up to here. */
  private horizonMs = 0;
  private seenRealMs = performance.now();
  private quietTurns = 0;
  private waiting: NodeJS.Timeout | null = null;
  private turning = false;
  private readonly timers = new TimerQueue();

  constructor(private readonly factor: number) {
    if (!(factor > 0)) throw new RangeError('A clock factor is above zero.');
  }

  /** Stands still while something that is due is at work. */
  now(): number {
    if (!this.turning) this.advance();
    return this.nowMs;
  }

  wallTimeMs(): number {
    return Date.now();
  }

  after(ms: number, run: () => void): Cancel {
    const cancel = this.timers.add(this.now() + Math.max(0, ms), run);
    this.quietTurns = 0;
    this.pump();
    return cancel;
  }

  sleep(ms: number, signal?: AbortSignal): Promise<void> {
    return sleepOn((delay, run) => this.after(delay, run), ms, signal);
  }

  /** As far as real time allows, but not past the next timer. */
  private advance(): void {
    const real = performance.now();
    this.horizonMs += Math.min(real - this.seenRealMs, longestGapMs) * this.factor;
    this.seenRealMs = real;
    this.nowMs = Math.max(this.nowMs, Math.min(this.horizonMs, this.timers.nextAtMs() ?? Infinity));
  }

  private pump(): void {
    if (this.waiting) clearTimeout(this.waiting);
    this.waiting = null;
    if (this.turning || this.timers.size === 0) return;
    this.turning = true;
    setImmediate(this.turn);
  }

  private readonly turn = (): void => {
    this.advance();
    const next = this.timers.nextAtMs();
    if (next === null || this.nowMs < next) {
      this.turning = false;
      if (next === null) return;
      const realMs = (next - this.nowMs) / this.factor;
      this.waiting = setTimeout(() => this.pump(), Math.min(realMs, longestGapMs / 2));
      return;
    }
    if (++this.quietTurns > idleTurns) {
      this.quietTurns = 0;
      this.timers.pop()!.run();
    }
    setImmediate(this.turn);
  };
}
