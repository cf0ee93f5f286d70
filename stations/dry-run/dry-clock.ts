import type { Cancel } from '../clock/clock';
import { TimerQueue } from '../clock/timer-queue';

/** Simulated time that is moved on by whoever waits: timers on the way fire in order, nothing is awaited. Milliseconds. */
export class DryClock {
  private nowMs = 0;
  private readonly timers = new TimerQueue();

  now(): number {
    return this.nowMs;
  }

  after(ms: number, run: () => void): Cancel {
    return this.timers.add(this.nowMs + Math.max(0, ms), run);
  }

  /** Goes on to `ms`, or to the timer after which `stop` says so. */
  advanceTo(ms: number, stop: () => boolean = never): void {
    for (let nextMs = this.timers.nextAtMs(); nextMs !== null && nextMs <= ms; nextMs = this.timers.nextAtMs()) {
      this.nowMs = Math.max(this.nowMs, nextMs);
      this.timers.pop()!.run();
      if (stop()) return;
    }
    this.nowMs = Math.max(this.nowMs, ms);
  }
}

const never = () => false;
