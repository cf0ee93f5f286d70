'use client';

import { useCallback, useEffect, useRef, useState } from 'react';
import type { Outcome } from '@/lib/contracts/outcome';
import type { SavedDraft, SaveDraft } from '@/lib/contracts/sequence-draft';
import { storable } from '@/lib/sequence/choose-conflict';
import { isSameDraft, type StoredDraft } from '@/lib/sequence/draft';
import { isUnsaved, type DraftEditor, type EditorEvent } from '@/lib/sequence/draft-editor';

export type SaveState =
  { kind: 'idle' } | { kind: 'saving' } | { kind: 'failed' } | { kind: 'refused'; sentence: string };

/** Until the next attempt, by how the last one ended. */
const waitMs = { idle: 600, failed: 3_000, refused: 10_000 };
const answerWithinMs = 10_000;

interface Autosave {
  revisionId: string;
  editor: DraftEditor;
  dispatch: (event: EditorEvent) => void;
  save: (form: SaveDraft) => Promise<Outcome<SavedDraft>>;
  enabled: boolean;
}

/**
 * Saves a moment after the last edit, again and again while the server does not answer. `sync` sends at once, which also brings in
 * what another person saved.
 */
export function useAutosave({ revisionId, editor, dispatch, save, enabled }: Autosave) {
  const [state, setState] = useState<SaveState>({ kind: 'idle' });
  const latest = useRef(editor);
  const busy = useRef(false);
  const unanswered = useRef<StoredDraft | null>(null);
  useEffect(() => {
    latest.current = editor;
  });

  const sync = useCallback(async () => {
    if (busy.current) return;
    busy.current = true;
    setState({ kind: 'saving' });
    const { history, saved } = latest.current;
    const sent = storable(history.present);
    const before = unanswered.current;
    unanswered.current = sent;
    try {
      const outcome = await within(answerWithinMs, save({ revisionId, version: saved.version, ...sent }));
      unanswered.current = null;
      if (!outcome.ok) return setState({ kind: 'refused', sentence: outcome.sentence });
      const { value } = outcome;
      setState({ kind: 'idle' });
      if (value.saved) return dispatch({ kind: 'saved', sent, version: value.version, savedAtIso: value.savedAtIso });
      // The answer to an earlier save was lost: what stands there is my own.
      if (before && isSameDraft(before, value))
        return dispatch({ kind: 'saved', sent: before, version: value.version, savedAtIso: value.savedAtIso });
      dispatch({ kind: 'heard', theirs: value, by: value.savedBy });
    } catch (error) {
      // A redirect to the sign-in page is Next's own error and must go on; the text is kept meanwhile.
      if (String((error as { digest?: unknown } | null)?.digest ?? '').startsWith('NEXT_')) throw error;
      setState({ kind: 'failed' });
    } finally {
      busy.current = false;
    }
  }, [revisionId, save, dispatch]);

  const unsaved = isUnsaved(editor);
  const { present } = editor.history;
  useEffect(() => {
    if (!enabled || !unsaved || state.kind === 'saving') return;
    const timer = setTimeout(() => void sync(), waitMs[state.kind]);
    return () => clearTimeout(timer);
  }, [enabled, unsaved, present, state, sync]);
  useEffect(() => {
    if (!enabled || !unsaved) return;
    const now = () => void sync();
    window.addEventListener('online', now);
    return () => window.removeEventListener('online', now);
  }, [enabled, unsaved, sync]);

  return { state, unsaved, sync };
}

function within<T>(ms: number, work: Promise<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error('No answer.')), ms);
    work.then(resolve, reject).finally(() => clearTimeout(timer));
  });
}
