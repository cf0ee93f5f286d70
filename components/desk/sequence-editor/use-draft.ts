'use client';

import { useEffect, useReducer, useState } from 'react';
import type { Outcome } from '@/lib/contracts/outcome';
import type { DraftPage, SavedDraft, SaveDraft } from '@/lib/contracts/sequence-draft';
import { advanceEditor, openEditor } from '@/lib/sequence/draft-editor';
import { newId } from './new-id';
import { keepText, takeKeptTexts } from './kept-text';
import { useAutosave } from './use-autosave';
import { usePresence } from './use-presence';

/** Until what another saved is here. */
const againMs = 3_000;

interface DraftJob {
  page: DraftPage;
  selectedId: string | null;
  save: (form: SaveDraft) => Promise<Outcome<SavedDraft>>;
}

/** The draft of this tab: edits and their undoing, saved as typed, kept in the browser until then, merged with what others save. */
export function useDraft({ page, selectedId, save }: DraftJob) {
  const { head, sequence, mayEdit } = page;
  const revisionId = head.id;
  const [editor, dispatch] = useReducer(advanceEditor, null, () =>
    openEditor({ sequence, warningReasons: head.warningReasons, version: head.version, savedAtIso: head.savedAtIso }),
  );
  const [tabId, setTabId] = useState<string | null>(null);
  const saving = useAutosave({ revisionId, editor, dispatch, save, enabled: mayEdit && tabId !== null });
  const presence = usePresence({ revisionId, tabId, stepId: selectedId, enabled: mayEdit });

  useEffect(() => {
    if (!mayEdit) return;
    for (const kept of takeKeptTexts(revisionId)) dispatch({ kind: 'restored', kept });
    // eslint-disable-next-line react-hooks/set-state-in-effect -- the tab has its name only in the browser.
    setTabId(newId());
  }, [revisionId, mayEdit]);

  const { present } = editor.history;
  const { saved } = editor;
  const isKept = saving.unsaved || present.conflicts.length > 0 || Object.keys(present.unread).length > 0;
  useEffect(() => {
    if (tabId === null) return;
    const { sequence: baseSequence, warningReasons } = saved;
    keepText(revisionId, tabId, isKept ? { draft: present, base: { sequence: baseSequence, warningReasons } } : null);
  }, [revisionId, tabId, isKept, present, saved]);

  const { sync } = saving;
  const newer = presence !== null && presence.version > saved.version;
  useEffect(() => {
    if (!newer || !mayEdit) return;
    void sync();
    const again = setInterval(() => void sync(), againMs);
    return () => clearInterval(again);
  }, [newer, mayEdit, sync]);

  return { editor, dispatch, saving, presence, isKept };
}
