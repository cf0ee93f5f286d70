'use client';

import { createContext, useContext } from 'react';
import type { BenchCommand } from '@/lib/contracts/bench-command';
import type { BenchView, Say } from '@/lib/contracts/bench-view';
import type { ReadingStore } from './live/reading-store';

/** `locked`: the browser gives no sound before a touch. */
export type SoundState = 'locked' | 'on' | 'muted';

export interface Bench {
  view: BenchView;
  /** A further screen of the same station watches: it shows everything and can do nothing. */
  leads: boolean;
  /** Nothing was heard from the server for 2 s; what is shown may be old. */
  lost: boolean;
  /** The refusal to show now. */
  refusal: (Say & { serial: string | null }) | null;
  readings: ReadingStore;
  send: (command: BenchCommand) => void;
  sound: SoundState;
  toggleSound: () => void;
}

const BenchContext = createContext<Bench | null>(null);
export const BenchProvider = BenchContext.Provider;

/** Everything a part of the bench screen needs. */
export function useBench(): Bench {
  const bench = useContext(BenchContext);
  if (!bench) throw new Error('useBench needs a BenchProvider above it.');
  return bench;
}
