'use client';

import { Toast as Radix } from 'radix-ui';
import { createContext, useCallback, useContext, useState, type ReactNode } from 'react';

interface Notice {
  id: number;
  text: string;
  undo?: () => void;
}

type ShowToast = (text: string, undo?: () => void) => void;
const ToastContext = createContext<ShowToast | null>(null);

/** Tells that something was done, with Undo where it can be undone. Never for faults. */
export function useToast(): ShowToast {
  const show = useContext(ToastContext);
  if (!show) throw new Error('useToast needs a ToastProvider above it.');
  return show;
}

/** An ink strip at the foot, for 8 s. */
export function ToastProvider({ children }: { children: ReactNode }) {
  const [notices, setNotices] = useState<Notice[]>([]);
  const show = useCallback<ShowToast>((text, undo) => {
    setNotices((before) => [...before.slice(-2), { id: (before.at(-1)?.id ?? 0) + 1, text, undo }]);
  }, []);
  const close = (id: number) => setNotices((before) => before.filter((notice) => notice.id !== id));
  return (
    <ToastContext value={show}>
      <Radix.Provider duration={8000} swipeDirection="down">
        {children}
        {notices.map((notice) => (
          <Radix.Root
            key={notice.id}
            onOpenChange={(open) => !open && close(notice.id)}
            className="flex min-h-11 items-center justify-between gap-6 bg-ink px-5 text-body text-paper"
          >
            <Radix.Title>{notice.text}</Radix.Title>
            {notice.undo ? (
              <Radix.Action altText="Undo" asChild>
                <button type="button" className="min-h-9 font-bold underline" onClick={notice.undo}>
                  Undo
                </button>
              </Radix.Action>
            ) : null}
          </Radix.Root>
        ))}
        <Radix.Viewport className="fixed inset-x-12 bottom-4 z-30 grid gap-2 max-sm:inset-x-[18px]" />
      </Radix.Provider>
    </ToastContext>
  );
}
