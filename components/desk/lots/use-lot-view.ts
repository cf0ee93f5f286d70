'use client';

import { usePathname, useSearchParams } from 'next/navigation';
import { useCallback, useEffect, useMemo, useRef } from 'react';
import { lotViewQuery, lotViewSchema, type LotView } from '@/lib/contracts/lot-view';

/**
 * What the address says is shown, and a way to change it. Only the address changes: the page stays, so that focus and the
 * chosen board stay too.
 */
export function useLotView(): [LotView, (change: Partial<LotView>) => void] {
  const path = usePathname();
  const query = useSearchParams();
  const view = useMemo(() => lotViewSchema.parse(Object.fromEntries(query)), [query]);
  const shown = lotViewQuery(view);
  /** Asked for and not drawn yet. Until then the router may still put an older address back, which must not be built on. */
  const wanted = useRef<LotView | null>(null);
  useEffect(() => {
    if (wanted.current && lotViewQuery(wanted.current) === shown) wanted.current = null;
  }, [shown]);
  useEffect(() => {
    const forget = () => {
      wanted.current = null;
    };
    window.addEventListener('popstate', forget);
    return () => window.removeEventListener('popstate', forget);
  }, []);
  const change = useCallback(
    (to: Partial<LotView>) => {
      const address = Object.fromEntries(new URLSearchParams(window.location.search));
      const next = { ...(wanted.current ?? lotViewSchema.parse(address)), ...to };
      wanted.current = next;
      const text = lotViewQuery(next);
      window.history.pushState(null, '', text ? `${path}?${text}` : path);
    },
    [path],
  );
  return [view, change];
}
