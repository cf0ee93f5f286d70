import { useEffect, useRef } from 'react';

const everyMs = 60;

/** Collects small turns and hands them on a few times a second, so that dragging does not flood the connection. */
export function useTurning(onTurn: (turns: number) => void): (turns: number) => void {
  const waiting = useRef(0);
  const newest = useRef(onTurn);
  useEffect(() => {
    newest.current = onTurn;
  });
  useEffect(() => {
    const timer = setInterval(() => {
      const turns = Math.max(-4, Math.min(4, waiting.current));
      if (Math.abs(turns) < 1e-4) return;
      waiting.current -= turns;
      newest.current(turns);
    }, everyMs);
    return () => clearInterval(timer);
  }, []);
  return (turns) => {
    waiting.current += turns;
  };
}
