import { useEffect, useRef } from 'react';

/** What a person typed while no field had the focus, after the scanner's keys were told apart. */
const typedEvent = 'sw-typed';

export function announceTyped(text: string) {
  window.dispatchEvent(new CustomEvent<string>(typedEvent, { detail: text }));
}

/** Listens to keys that a hand typed outside of fields. */
export function useTypedKeys(onTyped: (text: string) => void) {
  const newest = useRef(onTyped);
  useEffect(() => {
    newest.current = onTyped;
  });
  useEffect(() => {
    const listener = (event: Event) => newest.current((event as CustomEvent<string>).detail);
    window.addEventListener(typedEvent, listener);
    return () => window.removeEventListener(typedEvent, listener);
  }, []);
}
