'use client';

import { useState } from 'react';
import { fieldValue } from '@/lib/sequence/field-value';
import { blankKey } from '@/lib/sequence/draft';
import { typeInto } from '@/lib/sequence/draft-edits';
import { blankText, readBlank } from '@/lib/sequence/read-blank';
import { blankFrame } from './blank-look';
import { blankId } from './blank-ids';
import { useBlankState, type BlankProps } from './blank';
import { useEditor } from './editor-context';

/** A number or words. What was typed stands as it was typed, right or wrong; a good number takes its usual decimals afterwards. */
export function TypedBlank({ step, blank }: BlankProps) {
  const { edit, endGroup } = useEditor();
  const state = useBlankState({ step, blank });
  const [typing, setTyping] = useState<string | null>(null);
  const value = fieldValue(step, blank.field);
  const shown = typing !== null && isStill(typing) ? typing : (state.unread ?? blankText(value, blank));

  /** False once undo, a mend or another person changed what was typed. */
  function isStill(typed: string): boolean {
    if (state.unread !== undefined) return state.unread === typed;
    const read = readBlank(step, blank, typed);
    return read.ok && read.value === value;
  }

  const words = blank.input === 'text';
  const placeholder = blank.whenNull;
  const characters = Math.max(2, shown.length, shown === '' && placeholder ? placeholder.length : 0) + (words ? 1 : 0);
  return (
    <label
      className={`inline-flex items-baseline focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-ink ${blankFrame(state, blank.tone)}`}
    >
      <input
        id={blankId(step.id, blank.field)}
        aria-label={blank.unit ? `${blank.label}, ${blank.unit}` : blank.label}
        aria-invalid={state.error || undefined}
        aria-describedby={state.describedBy}
        data-blank=""
        type="text"
        inputMode={words ? undefined : blank.input === 'whole-number' ? 'numeric' : 'decimal'}
        autoComplete="off"
        spellCheck={words}
        value={shown}
        placeholder={placeholder}
        onChange={({ target }) => {
          setTyping(target.value);
          edit((draft) => typeInto(draft, step.id, blank, target.value), blankKey(step.id, blank.field));
        }}
        onBlur={() => {
          setTyping(null);
          endGroup();
        }}
        style={{ width: `${characters}ch` }}
        className={`min-w-0 max-w-full bg-transparent font-bold !outline-0 placeholder:font-normal placeholder:text-ink-3 ${words ? '' : 'font-num'}`}
      />
      {blank.unit ? <span className="ml-1 text-cap whitespace-nowrap text-ink-2">{blank.unit}</span> : null}
    </label>
  );
}
