'use client';

import { ChoiceArrow } from '@/components/ui/choice-arrow';
import { fieldValue } from '@/lib/sequence/field-value';
import { setField } from '@/lib/sequence/draft-edits';
import { stepWord } from '@/lib/sequence/value-words';
import { blankFrame } from './blank-look';
import { blankId } from './blank-ids';
import { useBlankState, type BlankProps } from './blank';
import { useEditor } from './editor-context';

/** One of the words of the blank, or a step of the sequence. */
export function ChoiceBlank({ step, blank }: BlankProps) {
  const { draft, edit } = useEditor();
  const state = useBlankState({ step, blank });
  const { steps } = draft.sequence;
  const options = blank.options ?? steps.map((each, i) => ({ value: each.id, label: `${i + 1} ${stepWord(each)}` }));
  const at = options.findIndex(({ value }) => value === fieldValue(step, blank.field));
  return (
    <span className="relative inline-block max-w-full">
      <select
        id={blankId(step.id, blank.field)}
        aria-label={blank.label}
        aria-invalid={state.error || undefined}
        aria-describedby={state.describedBy}
        data-blank=""
        value={at}
        onChange={({ target }) => {
          const option = options[Number(target.value)];
          if (option) edit((now) => setField(now, { stepId: step.id, field: blank.field, value: option.value }));
        }}
        className={`appearance-none font-bold text-ink ${blankFrame(state, blank.tone)} !pr-7`}
      >
        {at < 0 ? <option value={-1}>{blank.input === 'step' ? 'choose a step' : 'choose'}</option> : null}
        {options.map(({ value, label }, i) => (
          <option key={value} value={i}>
            {label}
          </option>
        ))}
      </select>
      <ChoiceArrow />
    </span>
  );
}
