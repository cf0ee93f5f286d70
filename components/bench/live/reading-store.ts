import type { BenchReading } from '@/lib/contracts/bench-view';

/** The newest reading, beside React: what draws it subscribes and repaints itself at display rate. */
export interface ReadingStore {
  latest: () => BenchReading | null;
  push: (reading: BenchReading | null) => void;
  subscribe: (listener: () => void) => () => void;
}

export function createReadingStore(): ReadingStore {
  let reading: BenchReading | null = null;
  const listeners = new Set<() => void>();
  return {
    latest: () => reading,
    push: (next) => {
      reading = next;
      for (const listener of listeners) listener();
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
  };
}
