import { useLayoutEffect, useState, useSyncExternalStore } from 'react';
import type { Beep } from './flood-machine';
import { createFloodStore } from './flood-store';

const browserClock = {
  now: () => performance.now(),
  after: (ms: number, run: () => void) => {
    const timer = setTimeout(run, ms);
    return () => clearTimeout(timer);
  },
};

/** Which beep floods the screen now. `heard` is the beep whose reading goes on. */
export function useFlood(heard: Beep | null): Beep | null {
  const [store] = useState(() => createFloodStore(browserClock));
  useLayoutEffect(() => store.hear(heard), [store, heard]);
  return useSyncExternalStore(store.subscribe, store.showing, () => null);
}
