'use client';

import { useLayoutEffect, useRef, useState, type RefObject } from 'react';

/** Width of an element in CSS pixels as it changes; `assumed` until it is on a screen. */
export function useElementWidth<Element extends HTMLElement>(assumed: number): [RefObject<Element | null>, number] {
  const ref = useRef<Element>(null);
  const [width, setWidth] = useState(assumed);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry && entry.contentRect.width > 0) setWidth(Math.round(entry.contentRect.width));
    });
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width];
}
