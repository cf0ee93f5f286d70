import { useEffect, useRef } from 'react';
import type { BenchReading } from '@/lib/contracts/bench-view';
import type { ReadingStore } from './reading-store';

/** Calls `paint` with the newest reading, once a frame at most, without rendering React again. */
export function useDisplayRate(store: ReadingStore, paint: (reading: BenchReading | null) => void) {
  const newest = useRef(paint);
  useEffect(() => {
    newest.current = paint;
    paint(store.latest());
  });
  useEffect(() => {
    let frame = 0;
    const leave = store.subscribe(() => {
      if (frame) return;
      frame = requestAnimationFrame(() => {
        frame = 0;
        newest.current(store.latest());
      });
    });
    return () => {
      leave();
      cancelAnimationFrame(frame);
    };
  }, [store]);
}
