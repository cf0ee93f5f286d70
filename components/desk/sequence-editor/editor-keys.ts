'use client';

import { useEffect, useEffectEvent } from 'react';
import { editorId } from './blank-ids';
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

/**
 * Keys of the whole editor, also while nothing has the focus, such as after a step was removed. Sheets and menus keep their own;
 * undo and redo are the draft's even in a field.
 */
export function useEditorKeys(keys: EditorKeys): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    const { target } = event;
    if (event.defaultPrevented || !(target instanceof HTMLElement)) return;
    if (target.closest('[role=dialog], [role=menu]')) return;
    if (target !== document.body && !document.getElementById(editorId)?.contains(target)) return;
    const act = actOf(event, target, keys);
    if (!act) return;
    event.preventDefault();
    act();
  });
  useEffect(() => {
    window.addEventListener('keydown', press);
    return () => window.removeEventListener('keydown', press);
  }, []);
}

function actOf(event: KeyboardEvent, target: HTMLElement, keys: EditorKeys): (() => void) | null {
  const { key, code, altKey, shiftKey } = event;
  const control = event.ctrlKey || event.metaKey;
  const { selectedId, locked, commands } = keys;
  const inText = target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement;
  // F8 belongs to the notices at the foot.
  if (code === 'KeyJ' && altKey && !control) return keys.nextError;
  if (key === '?' && !inText) return keys.showKeys;
  if (locked) return null;
  if (control && !altKey && code === 'KeyZ') return shiftKey ? keys.redo : keys.undo;
  if (control && !altKey && code === 'KeyY') return keys.redo;
  if (key === 'Enter' && !control && !altKey && target.dataset.blank !== undefined && inText)
    return () => nextBlank(target, shiftKey ? -1 : 1);
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

function nextBlank(from: HTMLElement, by: number): void {
  const blanks = [...document.querySelectorAll<HTMLElement>('[data-blank]')];
  blanks[blanks.indexOf(from) + by]?.focus();
}
