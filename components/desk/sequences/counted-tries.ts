import { useRef } from 'react';
import type { Outcome } from '@/lib/contracts/outcome';

/** The same action, whose refusal of a wrong password says how often it was tried while the dialog is open. */
export function useCountedTries<T>(action: (input: unknown) => Promise<Outcome<T>>) {
  const tries = useRef(0);
  return async (input: unknown): Promise<Outcome<T>> => {
    const outcome = await action(input);
    if (outcome.ok || outcome.code !== 'wrong-password') return outcome;
    tries.current += 1;
    return tries.current < 2 ? outcome : { ...outcome, sentence: `${outcome.sentence} Tried ${tries.current} times.` };
  };
}
