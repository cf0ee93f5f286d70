import type { FloodStore } from '@/components/bench/beep/flood-store';
import { heardBeep } from '@/components/bench/beep/heard-beep';
import type { BenchView } from '@/lib/contracts/bench-view';

/** The flood of a view that stands still. */
export const standingFlood = (view: BenchView): FloodStore => ({
  hear: () => {},
  showing: () => heardBeep(view),
  subscribe: () => () => {},
});
