'use client';

import { useEffect, useRef, useState } from 'react';
import type { BoardTypePrediction } from '@/lib/circuit/monte-carlo/types';
import type { BoardType } from '@/lib/contracts/board-type';
import type { PredictionAnswer } from './prediction-worker';

const restMs = 250;

/**
 * What the parts make of the limits, worked out beside the page: a quick answer, then the whole one. While something is typed the
 * last one stays. `working` until the whole answer for what is typed is there.
 */
export function usePrediction(boardType: BoardType): {
  prediction: BoardTypePrediction | null;
  working: boolean;
} {
  const [answer, setAnswer] = useState<{ of: string; prediction: BoardTypePrediction; whole: boolean } | null>(null);
  const { design, tolerances, trimmer, limits } = boardType;
  // Names, pictures and ranges do not move a point.
  const asked = JSON.stringify({ design, tolerances, trimmer, limits });
  const worker = useRef<Worker | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => {
      // One that still works on what was typed before cannot be told to stop otherwise.
      worker.current?.terminate();
      const fresh = new Worker(new URL('./prediction-worker.ts', import.meta.url), { type: 'module' });
      worker.current = fresh;
      fresh.onmessage = ({ data }: MessageEvent<PredictionAnswer>) => {
        setAnswer({ of: asked, ...data });
        if (data.whole) fresh.terminate();
      };
      fresh.postMessage(JSON.parse(asked));
    }, restMs);
    return () => clearTimeout(timer);
  }, [asked]);
  useEffect(() => () => worker.current?.terminate(), []);
  return {
    prediction: answer?.prediction ?? null,
    working: answer === null || answer.of !== asked || !answer.whole,
  };
}
