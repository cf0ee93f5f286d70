import { useSyncExternalStore } from 'react';
import { BeepFlood } from './beep-flood';
import type { FloodStore } from './flood-store';

/** The flood over everything else. It renders by itself, so that it need not wait for the screen under it. */
export function FloodLayer({ flood }: { flood: FloodStore }) {
  const beep = useSyncExternalStore(flood.subscribe, flood.showing, () => null);
  return beep === null ? null : <BeepFlood key={beep} beep={beep} />;
}
