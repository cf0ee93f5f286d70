'use client';

import type { NumberField } from '@/lib/board-type/fields';
import { fieldId, useBoardTypeForm } from './form-context';

interface QuantityInputProps {
  field: NumberField;
  /** Read out instead of the field's own label, where the row has said the rest. */
  label?: string;
  onFocus?: () => void;
}

/** One value as engineers type it: "4k7", "5.10 V", "± 1 %". As wide as its text. */
export function QuantityInput({ field, label, onFocus }: QuantityInputProps) {
  const { form, readOnly, sentenceOf, setText, settle } = useBoardTypeForm();
  const text = form.texts[field.path] ?? '';
  const wrong = sentenceOf(field.path);
  const state =
    wrong?.severity === 'error'
      ? 'border-2 border-reject bg-sheet px-1'
      : wrong
        ? 'border border-b-2 border-ink bg-attn-wash px-[5px]'
        : readOnly
          ? 'border-0 px-0'
          : 'border-0 border-b-2 border-rule bg-sheet px-1.5 pt-0.5 hover:border-accent';
  return (
    <input
      id={fieldId(field.path)}
      aria-label={label ?? field.label}
      aria-invalid={wrong?.severity === 'error' ? true : undefined}
      aria-describedby={wrong ? `${fieldId(field.path)}-says` : undefined}
      autoComplete="off"
      spellCheck={false}
      readOnly={readOnly}
      value={text}
      onChange={(event) => setText(field.path, event.target.value)}
      onBlur={() => settle(field.path)}
      onFocus={onFocus}
      style={{ width: `calc(${Math.max(4, text.length)}ch + 13px)` }}
      className={`min-h-[29px] max-w-full font-num text-[14px] font-bold text-ink max-sm:min-h-[46px] ${state}`}
    />
  );
}
