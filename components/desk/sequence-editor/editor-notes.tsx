'use client';

import { Notice } from '@/components/ui/notice';
import type { OtherEditor } from '@/lib/contracts/sequence-draft';
import type { Step } from '@/lib/sequence/step';
import type { LostAtStep } from '../dry-run/lost-at';
import { useEditor } from './editor-context';

interface EditorNotesProps {
  others: readonly OtherEditor[];
  steps: readonly Step[];
  lostAt: ReadonlyMap<string, LostAtStep> | null;
}

/** Over the steps: who else has the draft open, and why it cannot be changed now. */
export function EditorNotes({ others, steps, lostAt }: EditorNotesProps) {
  const { locked } = useEditor();
  const each = lostAt?.values().next().value?.boardsASquare;
  return (
    <div className="grid gap-2 pb-2 empty:hidden">
      {others.length > 0 ? (
        <Notice>{`${others.map((other) => openToo(other, steps)).join(' ')} What they save appears here.`}</Notice>
      ) : null}
      {locked ? (
        <p role="status" className="flex flex-wrap justify-between gap-x-6 text-ink-2">
          <span>{locked}</span>
          {each ? <span className="text-cap">Boards lost here so far, one square is {each}</span> : null}
        </p>
      ) : null}
    </div>
  );
}

function openToo({ name, stepId }: OtherEditor, steps: readonly Step[]): string {
  const at = steps.findIndex(({ id }) => id === stepId);
  return `${name} has this draft open too${at < 0 ? '' : `, at step ${at + 1}`}.`;
}
