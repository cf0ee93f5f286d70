import type { Cancel } from './clock';

interface Timer {
  atMs: number;
  order: number;
  run: () => void;
}

/** Timers by time, and those of one instant in the order they were set. */
export class TimerQueue {
  private order = 0;
  /** Latest first, so that the next one is popped from the end. */
  private readonly timers: Timer[] = [];

  get size(): number {
    return this.timers.length;
  }

  /** Null when there is none. */
  nextAtMs(): number | null {
    return this.timers.at(-1)?.atMs ?? null;
  }

  add(atMs: number, run: () => void): Cancel {
    const timer: Timer = { atMs, order: this.order++, run };
    this.timers.splice(this.indexOf(timer), 0, timer);
    return () => {
      const index = this.indexOf(timer);
      if (this.timers[index] === timer) this.timers.splice(index, 1);
    };
  }

  pop(): Timer | undefined {
    return this.timers.pop();
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
}
