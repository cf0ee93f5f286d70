'use client';

import { createContext, useContext } from 'react';
import type { BoardType } from '@/lib/contracts/board-type';
import type { SequenceComparison, StepComparison } from '@/lib/sequence/compare-sequences';
import type { Draft } from '@/lib/sequence/draft';
import type { SequenceFinding } from '@/lib/sequence/finding';

/** What every part of the sequence editor sees. */
export interface EditorView {
  draft: Draft;
  boardType: BoardType;
  /** Why nothing can be changed now; null: it can. */
  locked: string | null;
  edit(change: (draft: Draft) => Draft, group?: string): void;
  /** The field was left: what is typed next is undone by itself. */
  endGroup(): void;
  findings: readonly SequenceFinding[];
  /** Against the revision in use; null: there is none. */
  comparison: SequenceComparison | null;
  /** "r6"; null: none is in use. */
  releasedName: string | null;
  selectedId: string | null;
  select(stepId: string | null): void;
}

export const EditorContext = createContext<EditorView | null>(null);

export function useEditor(): EditorView {
  const view = useContext(EditorContext);
  if (!view) throw new Error('useEditor needs a sequence editor around it.');
  return view;
}

/** How a step differs from the one in use; null: not at all, or nothing is in use. */
export function changeOf({ comparison }: EditorView, stepId: string): StepComparison | null {
  return comparison?.steps.find((each) => each.stepId === stepId && each.changed) ?? null;
}
