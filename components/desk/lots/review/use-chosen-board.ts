'use client';

import { useState, type KeyboardEvent } from 'react';

const pageOfBoards = 10;

/** Where a key leads from a place; null leaves the key to the page, -1 chooses none. */
export function placeAfterKey(key: string, place: number | null, boards: number): number | null {
  const last = boards - 1;
  const within = (to: number) => Math.min(last, Math.max(0, to));
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return place === null ? 0 : within(place + 1);
    case 'ArrowLeft':
    case 'ArrowDown':
      return place === null ? last : within(place - 1);
    case 'PageUp':
      return within((place ?? 0) + pageOfBoards);
    case 'PageDown':
      return within((place ?? last) - pageOfBoards);
    case 'Home':
      return 0;
    case 'End':
      return last;
    case 'Escape':
      return place === null ? null : -1;
    default:
      return null;
  }
}

/** The board that the reader stands on, held by its serial so that boards that finish meanwhile do not move it. */
export function useChosenBoard(serials: readonly string[], open: (serial: string) => void) {
  const [serial, setSerial] = useState<string | null>(null);
  const found = serial === null ? -1 : serials.indexOf(serial);
  const place = found < 0 ? null : found;
  const choose = (to: number | null) => setSerial(to === null ? null : (serials[to] ?? null));
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey || serials.length === 0) return;
    if (event.key === 'Enter' && serial !== null) return open(serial);
    const to = placeAfterKey(event.key, place, serials.length);
    if (to === null) return;
    event.preventDefault();
    choose(to === -1 ? null : to);
  };
  return { place, choose, onKeyDown };
}
