'use client';

import { useEffect, useRef } from 'react';

/** Finds a board or a lot from any desk page. The key / puts the cursor here; a scanned code and Enter work too. */
export function DeskSearch() {
  const field = useRef<HTMLInputElement>(null);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      const target = event.target as HTMLElement;
      const writes = target.isContentEditable || ['INPUT', 'TEXTAREA', 'SELECT'].includes(target.tagName);
      if (event.key !== '/' || writes || event.ctrlKey || event.metaKey || event.altKey) return;
      event.preventDefault();
      field.current?.focus();
      field.current?.select();
    };
    document.addEventListener('keydown', onKey);
    return () => document.removeEventListener('keydown', onKey);
  }, []);
  return (
    <form action="/search" role="search" className="flex items-center">
      <input
        ref={field}
        name="q"
        type="search"
        aria-label="Serial number or lot"
        aria-keyshortcuts="/"
        placeholder="Serial or lot, key /"
        autoComplete="off"
        maxLength={60}
        className="min-h-9 w-[190px] border border-b-2 border-rule bg-sheet px-2.5 font-num text-[14px] text-ink placeholder:font-text placeholder:text-ink-3 hover:border-accent max-sm:min-h-[46px] max-sm:w-[150px]"
      />
    </form>
  );
}
