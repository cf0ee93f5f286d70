import type { Cancel, Clock } from './clock';
import { sleepOn } from './sleep-on';

/** Runs `factor` times faster than real time. Calendar time stays real, since due dates are compared with it. */
export class ScaledClock implements Clock {
  private readonly startedAt = performance.now();

  constructor(private readonly factor: number) {
    if (!(factor > 0)) throw new RangeError('A clock factor is above zero.');
  }

  now(): number {
    return (performance.now() - this.startedAt) * this.factor;
  }

  wallTimeMs(): number {
    return Date.now();
  }

  after(ms: number, run: () => void): Cancel {
    const timer = setTimeout(run, ms / this.factor);
    return () => clearTimeout(timer);
  }

  sleep(ms: number, signal?: AbortSignal): Promise<void> {
    return sleepOn((delay, run) => this.after(delay, run), ms, signal);
  }
}
