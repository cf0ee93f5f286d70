'use client';

import type { ReactNode } from 'react';
import type { History } from '@/lib/sequence/draft-history';
import { useEditor } from './editor-context';

interface ListFootProps {
  history: History<unknown>;
  onAdd: () => void;
  onUndo: () => void;
  onRedo: () => void;
  onKeys: () => void;
}

/** Under the steps: adding one, undo and redo, the keys, and what the bar at the left means. */
export function ListFoot({ history, onAdd, onUndo, onRedo, onKeys }: ListFootProps) {
  const { locked, releasedName } = useEditor();
  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1 py-1.5">
      {locked ? null : (
        <>
          <Press onClick={onAdd}>Add a step</Press>
          <Press onClick={onUndo} spent={history.past.length === 0}>
            Undo
          </Press>
          <Press onClick={onRedo} spent={history.future.length === 0}>
            Redo
          </Press>
        </>
      )}
      <Press onClick={onKeys}>Keys</Press>
      {releasedName ? (
        <span className="ml-auto flex items-center gap-2 text-cap text-ink-2">
          <span aria-hidden="true" className="h-4 w-[5px] bg-ink" />
          changed since {releasedName}
        </span>
      ) : null}
    </div>
  );
}

/** `spent`: there is nothing left to undo; it stays where it is, so that the focus does too. */
function Press({ onClick, spent = false, children }: { onClick: () => void; spent?: boolean; children: ReactNode }) {
  return (
    <button
      type="button"
      onClick={onClick}
      aria-disabled={spent || undefined}
      className={`min-h-[30px] underline-offset-4 max-sm:min-h-[46px] ${spent ? 'cursor-default text-ink-3' : 'text-accent underline hover:bg-accent-wash'}`}
    >
      {children}
    </button>
  );
}
