'use client';

import { Dialog as Radix } from 'radix-ui';
import { useRef, type ReactNode } from 'react';

interface DialogProps {
  open: boolean;
  onOpenChange: (open: boolean) => void;
  /** A question. */
  title: string;
  /** What follows from a yes. */
  consequence?: ReactNode;
  children?: ReactNode;
  /** Buttons that repeat the verb; the safe one carries `data-safe`. */
  actions?: ReactNode;
  /** Where the first focus goes: the safe choice, or the first field of a form. */
  focus?: 'safe' | 'first-field';
  /** At a bench: larger words and touch sizes. */
  size?: 'desk' | 'bench';
}

const sizes = {
  desk: 'w-[min(94vw,480px)] px-6 py-5 text-body',
  bench: 'sw-bench w-[min(96vw,calc(1100*var(--sw-b)))] px-12 py-9 text-b-line',
} as const;
const titles = { desk: 'text-lead', bench: 'text-b-next' } as const;

/** A sheet on an 8 px sill. The title asks; focus starts on the safe choice. */
export function Dialog(props: DialogProps) {
  const { open, onOpenChange, title, consequence, children, actions, focus = 'safe', size = 'desk' } = props;
  const sheet = useRef<HTMLDivElement>(null);
  const first = focus === 'safe' ? '[data-safe]' : 'input, textarea, select';
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      <Radix.Portal>
        <Radix.Overlay className="fixed inset-0 z-40 bg-ink-3 opacity-60" />
        <Radix.Content
          ref={sheet}
          onOpenAutoFocus={(event) => {
            const target = sheet.current?.querySelector<HTMLElement>(first);
            if (!target) return;
            event.preventDefault();
            target.focus();
          }}
          className={`fixed top-1/2 left-1/2 z-40 max-h-[94dvh] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-2 border-b-8 border-ink bg-sheet ${sizes[size]}`}
        >
          <Radix.Title className={`leading-tight font-bold ${titles[size]}`}>{title}</Radix.Title>
          <Radix.Description asChild>
            <div className="mt-1.5">{consequence}</div>
          </Radix.Description>
          {children ? <div className="mt-4 grid gap-4">{children}</div> : null}
          {actions ? (
            <div className={`mt-5 flex flex-wrap items-center ${size === 'bench' ? 'gap-(--sw-bench-gap)' : 'gap-4'}`}>
              {actions}
            </div>
          ) : null}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
