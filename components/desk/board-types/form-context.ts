'use client';

import { createContext, useContext } from 'react';
import type { BoardTypeForm } from '@/lib/board-type/board-type-form';

export interface FormAccess {
  form: BoardTypeForm;
  readOnly: boolean;
  /** What is wrong with the field at a path, or null. */
  sentenceOf(path: string): { sentence: string; severity: 'error' | 'warning' } | null;
  setText(path: string, text: string): void;
  /** Called when a field is left: a value that can be read is written as the page writes it. */
  settle(path: string): void;
  change(part: Partial<BoardTypeForm>): void;
}

const FormContext = createContext<FormAccess | null>(null);
export const FormProvider = FormContext.Provider;

export function useBoardTypeForm(): FormAccess {
  const access = useContext(FormContext);
  if (!access) throw new Error('useBoardTypeForm needs a FormProvider above it.');
  return access;
}

/** Id of the input that edits a path, for links that lead to it. */
export const fieldId = (path: string) => `field-${path}`;

export function focusField(path: string): void {
  const field = document.getElementById(fieldId(path));
  field?.scrollIntoView({ block: 'center' });
  field?.focus({ preventScroll: true });
}
