'use client';

import { fieldValue } from '@/lib/sequence/field-value';
import { blankKey } from '@/lib/sequence/draft';
import { readBlank } from '@/lib/sequence/read-blank';
import type { Step } from '@/lib/sequence/step';
import { valueWords } from '@/lib/sequence/value-words';
import type { SentenceField } from '@/lib/steps/step-kind';
import { messagesId } from './blank-ids';
import { ChoiceBlank } from './choice-blank';
import { useEditor } from './editor-context';
import { PictureBlank } from './picture-blank';
import { SwitchBlank } from './switch-blank';
import { TypedBlank } from './typed-blank';

export interface BlankProps {
  step: Step;
  blank: SentenceField;
}

/** A gap in a step's sentence, filled in by hand; only read while the draft is locked. */
export function Blank({ step, blank }: BlankProps) {
  const { locked, draft } = useEditor();
  if (locked)
    return (
      <b
        className={`border-b-2 border-dashed border-ink-3 ${blank.input === 'number' || blank.input === 'whole-number' ? 'font-num whitespace-nowrap' : ''}`}
      >
        {valueWords(fieldValue(step, blank.field), blank, draft.sequence.steps)}
      </b>
    );
  switch (blank.input) {
    case 'choice':
    case 'step':
      return <ChoiceBlank step={step} blank={blank} />;
    case 'switch':
      return <SwitchBlank step={step} blank={blank} />;
    case 'picture':
      return <PictureBlank step={step} blank={blank} />;
    default:
      return <TypedBlank step={step} blank={blank} />;
  }
}

/** How a blank stands: its unreadable text, and what the rules say of it. */
export function useBlankState({ step, blank }: BlankProps) {
  const { draft, findings } = useEditor();
  const unread = draft.unread[blankKey(step.id, blank.field)];
  const problem = unread === undefined ? null : readBlank(step, blank, unread);
  const own = findings.filter(({ stepId, field }) => stepId === step.id && field === blank.field);
  const inChoice = draft.conflicts.some(
    (each) => each.kind === 'value' && each.stepId === step.id && each.field === blank.field,
  );
  const error = problem !== null || own.some(({ severity }) => severity === 'error');
  return {
    unread,
    error,
    warning: inChoice || own.some(({ severity }) => severity === 'warning'),
    /** For aria-describedby. */
    describedBy: error || inChoice || own.length > 0 ? messagesId(step.id, blank.field) : undefined,
  };
}
