'use client';

import { useEffect, useRef, useState } from 'react';
import type { FalseHolds } from '@/lib/statistics/charts/false-holds';
import type { FalseHoldsAnswer, FalseHoldsQuestion } from './false-holds-worker';

const restMs = 400;

/**
 * What the rules cost where nothing is wrong, worked out beside the page once nothing was typed for a moment. The last answer stays
 * until the next is there; `working` until it is the whole one for what is asked. Null asks nothing.
 */
export function useFalseHolds(question: FalseHoldsQuestion | null): { answer: FalseHolds | null; working: boolean } {
  const [given, setGiven] = useState<(FalseHoldsAnswer & { of: string }) | null>(null);
  const asked = question === null ? null : JSON.stringify(question);
  const worker = useRef<Worker | null>(null);
  useEffect(() => {
    if (asked === null) return;
    const timer = setTimeout(() => {
      worker.current?.terminate();
      const fresh = new Worker(new URL('./false-holds-worker.ts', import.meta.url), { type: 'module' });
      worker.current = fresh;
      fresh.onmessage = ({ data }: MessageEvent<FalseHoldsAnswer>) => {
        setGiven({ of: asked, ...data });
        if (data.whole) fresh.terminate();
      };
      fresh.postMessage(JSON.parse(asked));
    }, restMs);
    return () => clearTimeout(timer);
  }, [asked]);
  useEffect(() => () => worker.current?.terminate(), []);
  return { answer: given?.answer ?? null, working: given === null || given.of !== asked || !given.whole };
}
