'use client';

import { useSortable } from '@dnd-kit/sortable';
import { useState } from 'react';
import { switchStep } from '@/lib/sequence/draft-edits';
import type { Step } from '@/lib/sequence/step';
import { stepWord } from '@/lib/sequence/value-words';
import type { LostAtStep } from '../dry-run/lost-at';
import { LostBoards } from '../dry-run/lost-boards';
import { rowId } from './blank-ids';
import { changeOf, useEditor } from './editor-context';
import { StepMenu, type StepActs } from './step-menu';
import { StepMessages } from './step-messages';
import { StepName } from './step-name';
import { StepSentence } from './step-sentence';
import { Switch } from './switch';

interface StepRowProps {
  step: Step;
  number: number;
  /** What the step takes on the typical board; null: it is not reached. */
  seconds: number | null;
  /** Boards lost here by the dry run that is at work; null: none is. */
  lost: LostAtStep | null;
  acts: Omit<StepActs, 'rename'>;
}

/** One step: change bar, grip, number, name, sentence with blanks, time, switch, menu; messages under the sentence. */
export function StepRow({ step, number, seconds, lost, acts }: StepRowProps) {
  const editor = useEditor();
  const { locked, selectedId, select, edit, releasedName } = editor;
  const [naming, setNaming] = useState(false);
  const { attributes, listeners, setNodeRef, setActivatorNodeRef, transform, transition, isDragging } = useSortable({
    id: step.id,
    disabled: locked !== null,
  });
  const selected = selectedId === step.id;
  const change = changeOf(editor, step.id);
  return (
    <li
      ref={setNodeRef}
      id={rowId(step.id)}
      style={{ transform: transform ? `translate3d(0, ${Math.round(transform.y)}px, 0)` : undefined, transition }}
      className={selected || isDragging ? 'relative z-[1]' : undefined}
    >
      <div
        role="group"
        aria-label={`Step ${number}, ${stepWord(step)}${step.enabled ? '' : ', off'}`}
        data-selected={selected}
        onFocus={() => selected || select(step.id)}
        onClick={() => selected || select(step.id)}
        onKeyDown={(event) => {
          if (event.key !== 'F2' || locked) return;
          event.preventDefault();
          setNaming(true);
        }}
        className={`relative grid grid-cols-[24px_26px_minmax(0,1fr)_auto] items-start gap-x-2 border-b border-hair py-1 pl-3 sm:grid-cols-[24px_26px_138px_minmax(0,1fr)_auto] ${
          isDragging ? 'bg-sheet outline-2 outline-ink' : selected ? 'bg-sheet outline-2 outline-accent' : ''
        } ${step.enabled ? '' : 'text-ink-3 [&_input]:text-ink-3 [&_select]:text-ink-3'}`}
      >
        {change ? (
          <span className="absolute inset-y-1 left-0 w-[5px] bg-ink">
            <span className="sr-only">changed since {releasedName}</span>
          </span>
        ) : null}
        {locked ? (
          <span />
        ) : (
          <button
            type="button"
            ref={setActivatorNodeRef}
            {...attributes}
            {...listeners}
            aria-label={`Move step ${number}, ${stepWord(step)}`}
            className="mt-1 inline-flex min-h-[30px] cursor-grab touch-none items-center justify-center text-accent hover:bg-accent-wash max-sm:min-h-[46px]"
          >
            <svg width="10" height="16" viewBox="0 0 10 16" aria-hidden="true" fill="currentColor">
              <path d="M0 0h4v4H0zM6 0h4v4H6zM0 6h4v4H0zM6 6h4v4H6zM0 12h4v4H0zM6 12h4v4H6z" />
            </svg>
          </button>
        )}
        <span className="pt-[7px] text-right font-num font-bold max-sm:pt-[15px]">{number}</span>
        <span className="pt-1">
          <StepName step={step} number={number} naming={naming} onNaming={setNaming} />
          {step.enabled ? null : <b className="block text-cap">off</b>}
          {change?.before === null ? <span className="block text-cap text-ink-2">new</span> : null}
          {change?.moved ? <span className="block text-cap text-ink-2">was step {change.placeBefore}</span> : null}
          {change?.renamed ? <span className="block text-cap text-ink-2">was {stepWord(change.before!)}</span> : null}
          {change?.switched ? (
            <span className="block text-cap text-ink-2">was {change.switched === 'on' ? 'off' : 'on'}</span>
          ) : null}
        </span>
        <div className="min-w-0 max-sm:order-last max-sm:col-span-full max-sm:pl-[58px]">
          <StepSentence step={step} />
          <StepMessages step={step} />
        </div>
        <div className="flex min-h-[34px] items-center gap-2 pt-1">
          {lost ? <LostBoards lost={lost} /> : null}
          <span className="w-[62px] text-right font-num text-ink-2">
            {!step.enabled ? (
              ''
            ) : seconds === null ? (
              <span title="A typical board does not get here">–</span>
            ) : (
              `${seconds.toFixed(1)} s`
            )}
          </span>
          {locked ? null : (
            <>
              <Switch
                label={`Run step ${number}, ${stepWord(step)}`}
                on={step.enabled}
                onChange={(on) => edit((draft) => switchStep(draft, step.id, on))}
              />
              <StepMenu label={`More for step ${number}`} acts={{ ...acts, rename: () => setNaming(true) }} />
            </>
          )}
        </div>
      </div>
    </li>
  );
}
