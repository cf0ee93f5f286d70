'use client';

import type { Step } from '@/lib/sequence/step';
import { shownNumber } from '@/lib/sequence/value-words';
import { kindOf } from '@/lib/steps/step-kinds';
import type { ValueChange } from '@/lib/sequence/compare-sequences';
import type { SentenceField, SentencePart } from '@/lib/steps/step-kind';
import { Blank } from './blank';
import { changeOf, useEditor } from './editor-context';

/** What a step does, as a sentence with blanks; beside a changed one, what it is in the revision in use. */
export function StepSentence({ step }: { step: Step }) {
  const editor = useEditor();
  const change = changeOf(editor, step.id);
  const parts = kindOf(step).sentence(step);
  return (
    <p className="leading-[38px] max-sm:leading-[52px]">
      {parts.map((part, i) => {
        if (typeof part === 'string') return typeof parts[i - 1] === 'object' ? part.slice(stopOf(part).length) : part;
        return (
          <span key={i} className={part.input === 'text' ? undefined : 'whitespace-nowrap'}>
            <Blank step={step} blank={part} />
            <Was change={change?.values.find(({ field }) => field === part.field)} blank={part} />
            {stopOf(parts[i + 1])}
          </span>
        );
      })}
    </p>
  );
}

/** A comma after a blank stays on its line. */
const stopOf = (part: SentencePart | undefined) => (typeof part === 'string' ? (/^[,;.]/.exec(part)?.[0] ?? '') : '');

function Was({ change, blank }: { change: ValueChange | undefined; blank: SentenceField }) {
  if (!change) return null;
  const { before, from } = change;
  const number = typeof before === 'number' && !blank.options;
  return <span className="text-cap text-ink-2"> (was {number ? shownNumber(before, blank) : from})</span>;
}
