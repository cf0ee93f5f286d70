import { advanceFlood, floodWakeMs, noFlood, type Beep, type FloodState } from './flood-machine';

/** Monotonic milliseconds and one timer, so that tests bring their own. */
export interface FloodClock {
  now: () => number;
  after: (ms: number, run: () => void) => () => void;
}

export interface FloodStore {
  /** Tells which beep's reading goes on; answers at once where the timing allows. */
  hear: (heard: Beep | null) => void;
  showing: () => Beep | null;
  subscribe: (listener: () => void) => () => void;
}

/** Runs the flood machine on a clock. */
export function createFloodStore(clock: FloodClock): FloodStore {
  let state: FloodState = noFlood;
  let heard: Beep | null = null;
  let cancel = () => {};
  const listeners = new Set<() => void>();
  const step = () => {
    cancel();
    const next = advanceFlood(state, heard, clock.now());
    const changed = next.showing !== state.showing;
    state = next;
    const wake = floodWakeMs(state, heard, clock.now());
    cancel = wake === null ? () => {} : clock.after(wake + 1, step);
    if (changed) for (const listener of listeners) listener();
  };
  return {
    hear: (beep) => {
      heard = beep;
      step();
    },
    showing: () => state.showing,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
