'use client';

import { useState } from 'react';
import type { FieldValues, Path, UseFormReturn } from 'react-hook-form';
import type { Outcome } from '@/lib/contracts/outcome';

const unreachable = 'The server did not answer. Nothing was stored; what you entered is still here. Try again.';

/**
 * Sends a form to a server action. A refusal stands beside its field, or is returned as `problem` for the foot of the form;
 * what was entered stays.
 */
export function useActionForm<Entered extends FieldValues, Parsed, Value>(
  form: UseFormReturn<Entered, unknown, Parsed>,
  action: (input: Parsed) => Promise<Outcome<Value>>,
  onDone: (value: Value) => void,
) {
  const [problem, setProblem] = useState<string | null>(null);
  const send = form.handleSubmit(async (entered) => {
    setProblem(null);
    let outcome: Outcome<Value>;
    try {
      outcome = await action(entered);
    } catch (error) {
      // A redirect to the sign-in page is Next's own error and must go on.
      if (String((error as { digest?: unknown }).digest ?? '').startsWith('NEXT_')) throw error;
      setProblem(unreachable);
      return;
    }
    if (outcome.ok) return onDone(outcome.value);
    if (outcome.field)
      form.setError(outcome.field as Path<Entered>, { message: outcome.sentence }, { shouldFocus: true });
    else setProblem(outcome.sentence);
  });
  return { send, problem, sending: form.formState.isSubmitting };
}
