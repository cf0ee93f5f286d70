import { useCallback, useEffect, useState } from 'react';
import { useTypedKeys } from '../scanner/typed-keys';

/** Digits of the PIN being typed. Emptied when the server has answered, which shows as a newer view. */
export interface Pin {
  digits: string;
  fewest: number;
  press: (digit: string) => void;
  erase: () => void;
  submit: () => void;
  complete: boolean;
}

const fewest = 4;
const most = 8;

export function usePin(onSubmit: (digits: string) => void, revision: number): Pin {
  const [entry, setEntry] = useState({ digits: '', sentAt: -1 });
  if (entry.sentAt >= 0 && revision > entry.sentAt) setEntry({ digits: '', sentAt: -1 });
  const { digits } = entry;
  const complete = digits.length >= fewest && entry.sentAt < 0;
  const press = useCallback((digit: string) => {
    setEntry((before) =>
      before.sentAt < 0 && before.digits.length < most ? { ...before, digits: before.digits + digit } : before,
    );
  }, []);
  const erase = useCallback(
    () => setEntry((before) => (before.sentAt < 0 ? { ...before, digits: before.digits.slice(0, -1) } : before)),
    [],
  );
  const submit = () => {
    if (!complete) return;
    setEntry({ digits, sentAt: revision });
    onSubmit(digits);
  };
  useTypedKeys((text) => [...text].filter((key) => /\d/.test(key)).forEach(press));
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => event.key === 'Backspace' && erase();
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [erase]);
  return { digits, fewest, press, erase, submit, complete };
}
