/**
 * One change in and one out (WCAG 2.3.1): a flood is seen for at least 1.5 s, and at least 1 s lies between two. Each has
 * 0.1 s more here, since a busy screen paints late.
 */
export const floodTiming = { shortestMs: 1600, gapMs: 1100 } as const;

export type Beep = 1 | 2;

export interface FloodState {
  /** Which beep floods the screen now. */
  showing: Beep | null;
  since: number;
  endedAt: number | null;
}

export const noFlood: FloodState = { showing: null, since: 0, endedAt: null };

/**
 * What to show at `now`, when the run says that beep `heard` was just given and its reading is not done (null: none).
 * A flood that is due too soon after the last one waits, and is left out if it is over by then.
 */
export function advanceFlood(state: FloodState, heard: Beep | null, now: number): FloodState {
  if (state.showing !== null) {
    const done = heard !== state.showing && now - state.since >= floodTiming.shortestMs;
    return done ? { showing: null, since: state.since, endedAt: now } : state;
  }
  if (heard === null) return state;
  if (state.endedAt !== null && now - state.endedAt < floodTiming.gapMs) return state;
  return { showing: heard, since: now, endedAt: state.endedAt };
}

/** When `advanceFlood` must be asked again though nothing else happens; null: never. Milliseconds from `now`. */
export function floodWakeMs(state: FloodState, heard: Beep | null, now: number): number | null {
  if (state.showing !== null) {
    if (heard === state.showing) return null;
    return Math.max(0, state.since + floodTiming.shortestMs - now);
  }
  if (heard === null || state.endedAt === null) return null;
  return Math.max(0, state.endedAt + floodTiming.gapMs - now);
}
