import { storable } from './choose-conflict';
import { isSameDraft, openDraft, type Draft, type StoredDraft } from './draft';
import { beginHistory, endGroup, rebase, record, redo, undo, type History } from './draft-history';
import { mergeDrafts } from './merge-drafts';

/** A draft as the server holds it. */
export interface Saved extends StoredDraft {
  version: number;
  savedAtIso: string;
}

export interface DraftEditor {
  history: History<Draft>;
  /** What was last saved from here or heard from there; merges start from it. */
  saved: Saved;
}

/** Text of a tab that was closed or lost before it was saved. */
export interface KeptDraft {
  draft: Draft;
  /** What the draft was made from. */
  base: StoredDraft;
}

export type EditorEvent =
  | { kind: 'edit'; change: (draft: Draft) => Draft; group?: string }
  | { kind: 'end-group' }
  | { kind: 'undo' }
  | { kind: 'redo' }
  | { kind: 'saved'; sent: StoredDraft; version: number; savedAtIso: string }
  | { kind: 'heard'; theirs: Saved; by: string }
  | { kind: 'restored'; kept: KeptDraft };

export function openEditor(saved: Saved): DraftEditor {
  return { history: beginHistory(openDraft(saved)), saved };
}

export const isUnsaved = ({ history, saved }: DraftEditor): boolean => !isSameDraft(storable(history.present), saved);

/** The draft in one tab: its edits, their undoing, and what others save meanwhile. */
export function advanceEditor(editor: DraftEditor, event: EditorEvent): DraftEditor {
  const { history, saved } = editor;
  switch (event.kind) {
    case 'edit':
      return { ...editor, history: record(history, event.change(history.present), event.group) };
    case 'end-group':
      return { ...editor, history: endGroup(history) };
    case 'undo':
      return { ...editor, history: undo(history) };
    case 'redo':
      return { ...editor, history: redo(history) };
    case 'saved':
      return { ...editor, saved: { ...event.sent, version: event.version, savedAtIso: event.savedAtIso } };
    case 'heard': {
      if (event.theirs.version <= saved.version) return editor;
      const merge = (entry: Draft) => mergeDrafts(saved, entry, event.theirs, event.by);
      return { history: rebase(history, merge), saved: event.theirs };
    }
    case 'restored': {
      const { base, draft } = event.kept;
      const here = history.present;
      const restored = mergeDrafts(base, draft, storable(here), 'The saved draft');
      const unread = { ...restored.unread, ...here.unread };
      return { ...editor, history: record(history, { ...restored, unread }) };
    }
  }
}
