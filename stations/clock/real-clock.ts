import type { Cancel, Clock } from './clock';
import { sleepOn } from './sleep-on';

/** The clock on the wall. */
export class RealClock implements Clock {
  now(): number {
    return performance.now();
  }

  wallTimeMs(): number {
    return Date.now();
  }

  after(ms: number, run: () => void): Cancel {
    const timer = setTimeout(run, ms);
    return () => clearTimeout(timer);
  }

  sleep(ms: number, signal?: AbortSignal): Promise<void> {
    return sleepOn((delay, run) => this.after(delay, run), ms, signal);
  }
}
