import type { ReactNode } from 'react';
import { VerdictMark } from './verdict-mark';

export interface FieldMessages {
  label: string;
  /** Under the field when there is nothing to correct. */
  hint?: ReactNode;
  /** Red frame, square and sentence. */
  error?: string | null;
  /** Amber field, ink frame, triangle and sentence; the form can still be sent. */
  warning?: string | null;
}

/** Identifiers and classes that a control inside `Field` uses. */
export function fieldControl(id: string, { hint, error, warning }: FieldMessages) {
  const state = error
    ? 'border-2 border-reject bg-sheet'
    : warning
      ? 'border border-b-2 border-ink bg-attn-wash'
      : 'border border-b-2 border-rule bg-sheet [dialog_&,[role=dialog]_&]:bg-paper';
  return {
    id,
    'aria-invalid': error ? true : undefined,
    'aria-describedby': error || warning || hint ? `${id}-message` : undefined,
    className: `min-h-[38px] w-full px-2.5 text-body font-bold text-ink placeholder:font-normal placeholder:text-ink-3 max-sm:min-h-[46px] ${state}`,
  } as const;
}

/** Label above, message row below. The frame of every form field. */
export function Field({ id, messages, children }: { id: string; messages: FieldMessages; children: ReactNode }) {
  const { label, hint, error, warning } = messages;
  return (
    <div className="grid content-start gap-1">
      <label htmlFor={id} className="text-cap text-ink">
        {label}
      </label>
      {children}
      {error || warning || hint ? (
        <p
          id={`${id}-message`}
          className={`flex items-start gap-1.5 text-cap ${error ? 'font-bold text-reject' : 'text-ink-2'}`}
          role={error ? 'alert' : undefined}
        >
          {error ? <VerdictMark shape="reject" size={13} /> : warning ? <VerdictMark shape="check" size={14} /> : null}
          <span>{error || warning || hint}</span>
        </p>
      ) : null}
    </div>
  );
}
