'use client';

import { useState } from 'react';
import { renameStep } from '@/lib/sequence/draft-edits';
import type { Step } from '@/lib/sequence/step';
import { stepWord } from '@/lib/sequence/value-words';
import { kindOf } from '@/lib/steps/step-kinds';
import { useEditor } from './editor-context';

interface StepNameProps {
  step: Step;
  number: number;
  naming: boolean;
  onNaming: (naming: boolean) => void;
}

/** What the engineer calls the step; pressed, it becomes a field. Empty is the word of its kind. */
export function StepName({ step, number, naming, onNaming }: StepNameProps) {
  const { edit, endGroup, locked, selectedId } = useEditor();
  const [before, setBefore] = useState(step.name);
  const look = `text-left font-bold ${selectedId === step.id ? 'text-accent' : ''}`;
  if (locked) return <span className={`block py-[3px] ${look}`}>{stepWord(step)}</span>;
  if (!naming)
    return (
      <button
        type="button"
        data-name=""
        aria-label={`Name of step ${number}: ${stepWord(step)}`}
        onClick={() => onNaming(true)}
        className={`min-h-[30px] break-words hover:underline max-sm:min-h-[46px] ${look}`}
      >
        {stepWord(step)}
      </button>
    );
  const end = () => {
    endGroup();
    onNaming(false);
  };
  return (
    <input
      autoFocus
      aria-label={`Name of step ${number}`}
      value={step.name}
      placeholder={kindOf(step).word}
      maxLength={40}
      onFocus={({ target }) => {
        setBefore(step.name);
        target.select();
      }}
      onChange={({ target }) => edit((draft) => renameStep(draft, step.id, target.value), `name/${step.id}`)}
      onBlur={end}
      onKeyDown={(event) => {
        if (event.key === 'Escape') edit((draft) => renameStep(draft, step.id, before), `name/${step.id}`);
        if (event.key !== 'Enter' && event.key !== 'Escape') return;
        event.preventDefault();
        event.stopPropagation();
        const row = event.currentTarget.closest('li');
        end();
        requestAnimationFrame(() => row?.querySelector<HTMLElement>('[data-name]')?.focus());
      }}
      className="min-h-[30px] w-full border-2 border-transparent border-b-rule bg-paper px-1 font-bold placeholder:font-normal placeholder:text-ink-3 max-sm:min-h-[46px]"
    />
  );
}
