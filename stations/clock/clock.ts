/** The passing of time, given to everything in `stations` so that a bench runs on the real, a faster or a virtual clock. */
export interface Clock {
  /** Monotonic milliseconds since an arbitrary start. */
  now(): number;
  /** Calendar time in milliseconds since the epoch. */
  wallTimeMs(): number;
  /** Calls `run` once after `ms`; the returned function cancels it. */
  after(ms: number, run: () => void): Cancel;
  /** Resolves after `ms`; rejects with the signal's reason when aborted. */
  sleep(ms: number, signal?: AbortSignal): Promise<void>;
}

export type Cancel = () => void;
