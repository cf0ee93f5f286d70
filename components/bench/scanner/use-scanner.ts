import { useEffect, useRef } from 'react';
import { idleRecogniser, patienceMs, takeCharacter, takeEnd, takeSilence, type Recognised } from './recognise-scan';
import { announceTyped } from './typed-keys';

/** Enter presses the filled button only after this long without scanner input. Milliseconds. */
export const enterQuietMs = 300;

interface ScannerHandlers {
  onScan: (text: string) => void;
  /** Escape, always. */
  onStop: () => void;
}

/**
 * Tells a scanner from a hand, wherever the focus is. Keys are held back for a blink; a code never reaches a field, what
 * a hand typed does.
 */
export function useScanner(handlers: ScannerHandlers) {
  const newest = useRef(handlers);
  useEffect(() => {
    newest.current = handlers;
  });
  useEffect(() => {
    let state = idleRecogniser;
    let lastScanMs = -Infinity;
    let timer: ReturnType<typeof setTimeout> | undefined;
    const settle = (seen: Recognised) => {
      state = seen.state;
      clearTimeout(timer);
      if (seen.typed) typeInto(document.activeElement, seen.typed);
      if (seen.scan !== null) {
        lastScanMs = state.lastKeyMs;
        newest.current.onScan(seen.scan.trim());
      }
      if (state.held)
        timer = setTimeout(
          () => settle(takeSilence(state, state.lastKeyMs + patienceMs(state))),
          patienceMs(state) + 5,
        );
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.isComposing || event.ctrlKey || event.metaKey || event.altKey) return;
      // When the key went down, not when a busy page got round to it.
      const now = event.timeStamp;
      if (event.key === 'Escape') return newest.current.onStop();
      if (event.key.length === 1) {
        if (event.key === ' ' && !state.held) return;
        event.preventDefault();
        return settle(takeCharacter(state, event.key, now));
      }
      if (event.key === 'Enter' || event.key === 'Tab') {
        const seen = takeEnd(state, now);
        settle(seen);
        const quiet = now - lastScanMs >= enterQuietMs;
        if (seen.scan !== null || (event.key === 'Enter' && !quiet)) {
          event.preventDefault();
          event.stopPropagation();
        } else if (event.key === 'Enter') pressFilled(event);
        return;
      }
      if (state.held && event.key !== 'Shift') settle({ ...takeSilence(state, now), scan: null, typed: state.held });
    };
    window.addEventListener('keydown', onKey, { capture: true });
    return () => {
      clearTimeout(timer);
      window.removeEventListener('keydown', onKey, { capture: true });
    };
  }, []);
}

/** Puts what a hand typed where it belongs: the focused field, or whoever listens for typed keys. */
function typeInto(target: Element | null, text: string) {
  if (!(target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement)) return announceTyped(text);
  target.setRangeText(
    text,
    target.selectionStart ?? target.value.length,
    target.selectionEnd ?? target.value.length,
    'end',
  );
  target.dispatchEvent(new InputEvent('input', { bubbles: true, data: text, inputType: 'insertText' }));
}

/** Enter with the focus on nothing of its own presses the filled button, of the topmost dialog if one is open. */
function pressFilled(event: KeyboardEvent) {
  const focused = document.activeElement;
  if (focused && focused.matches('a, button, input, select, textarea, [role=slider]')) return;
  const scope = [...document.querySelectorAll('[role=dialog]')].at(-1) ?? document;
  const button = scope.querySelector<HTMLButtonElement>('button[data-filled]');
  if (!button) return;
  event.preventDefault();
  button.click();
}
