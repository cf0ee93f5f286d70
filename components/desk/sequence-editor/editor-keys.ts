'use client';

import type { KeyboardEvent } from 'react';
import type { StepCommands } from './step-commands';

interface EditorKeys {
  selectedId: string | null;
  locked: boolean;
  commands: StepCommands;
  undo(): void;
  redo(): void;
  nextError(): void;
  showKeys(): void;
}

/** Keys of the whole editor. Fields keep their own; undo and redo are the draft's even in a field. */
export function editorKeys(keys: EditorKeys) {
  return (event: KeyboardEvent<HTMLElement>) => {
    if (event.defaultPrevented) return;
    const act = actOf(event, keys);
    if (!act) return;
    event.preventDefault();
    act();
  };
}

function actOf(event: KeyboardEvent<HTMLElement>, keys: EditorKeys): (() => void) | null {
  const { target, key, code, altKey, shiftKey } = event;
  const control = event.ctrlKey || event.metaKey;
  const { selectedId, locked, commands } = keys;
  if (!(target instanceof HTMLElement)) return null;
  const inText = target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement;
  // F8 belongs to the notices at the foot.
  if (code === 'KeyJ' && altKey && !control) return keys.nextError;
  if (key === '?' && !inText) return keys.showKeys;
  if (locked) return null;
  if (control && !altKey && code === 'KeyZ') return shiftKey ? keys.redo : keys.undo;
  if (control && !altKey && code === 'KeyY') return keys.redo;
  if (key === 'Enter' && !control && !altKey && target.dataset.blank !== undefined && inText)
    return () => nextBlank(event.currentTarget, target, shiftKey ? -1 : 1);
  if (!altKey || control || selectedId === null) return null;
  const acts = commands.actsOf(selectedId);
  if (code === 'KeyO') return () => commands.switchOver(selectedId);
  return (
    {
      ArrowUp: acts.moveUp,
      ArrowDown: acts.moveDown,
      KeyN: acts.addAfter,
      KeyC: acts.duplicate,
      Delete: acts.remove,
    }[code] ?? null
  );
}

function nextBlank(editor: HTMLElement, from: HTMLElement, by: number): void {
  const blanks = [...editor.querySelectorAll<HTMLElement>('[data-blank]')];
  blanks[blanks.indexOf(from) + by]?.focus();
}
