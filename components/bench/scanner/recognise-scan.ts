import { scanPrefixes } from '@/lib/bench/scan-code';

/** A scanner types faster than a hand. Milliseconds between two keys, and fewest characters of a code. */
export const scannerTiming = { gapMs: 45, prefixGapMs: 110, fewest: 5, unendedFewest: 8 } as const;

export interface Recogniser {
  /** Keys held back until it is clear who types. */
  held: string;
  lastKeyMs: number;
}

export const idleRecogniser: Recogniser = { held: '', lastKeyMs: -Infinity };

/** `typed` is what a hand wrote and goes where the focus is; `scan` is a code. `enter`: a person pressed Enter. */
export interface Recognised {
  state: Recogniser;
  typed: string;
  scan: string | null;
  enter: boolean;
}

const prefixes = Object.values(scanPrefixes);
const mayBeOurs = (text: string) => prefixes.some((prefix) => text.startsWith(prefix) || prefix.startsWith(text));

/** How long to wait for the next key before the held ones are taken as typed. */
export const patienceMs = (state: Recogniser) =>
  mayBeOurs(state.held.toUpperCase()) ? scannerTiming.prefixGapMs : scannerTiming.gapMs;

/** A key that prints one character. */
export function takeCharacter(state: Recogniser, character: string, atMs: number): Recognised {
  const goesOn = state.held !== '' && atMs - state.lastKeyMs <= patienceMs(state);
  const typed = goesOn ? '' : state.held;
  return {
    state: { held: (goesOn ? state.held : '') + character, lastKeyMs: atMs },
    typed,
    scan: null,
    enter: false,
  };
}

/** Enter or Tab, which scanners send at the end of a code. */
export function takeEnd(state: Recogniser, atMs: number): Recognised {
  const goesOn = atMs - state.lastKeyMs <= scannerTiming.prefixGapMs;
  if (goesOn && state.held.length >= scannerTiming.fewest) {
    return { state: { held: '', lastKeyMs: atMs }, typed: '', scan: state.held, enter: false };
  }
  return { state: { held: '', lastKeyMs: state.lastKeyMs }, typed: state.held, scan: null, enter: true };
}

/** Nothing came for `patienceMs`: a long fast run was a scanner that sends no end, anything else a hand. */
export function takeSilence(state: Recogniser, atMs: number): Recognised {
  const scan = state.held.length >= scannerTiming.unendedFewest ? state.held : null;
  return {
    state: { held: '', lastKeyMs: scan === null ? state.lastKeyMs : atMs },
    typed: scan === null ? state.held : '',
    scan,
    enter: false,
  };
}
