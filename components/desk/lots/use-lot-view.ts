'use client';

import { usePathname, useSearchParams } from 'next/navigation';
import { useCallback, useMemo } from 'react';
import { lotViewQuery, lotViewSchema, type LotView } from '@/lib/contracts/lot-view';

/**
 * What the address says is shown, and a way to change it. Only the address changes: the page stays, so that focus and the
 * chosen board stay too.
 */
export function useLotView(): [LotView, (change: Partial<LotView>) => void] {
  const path = usePathname();
  const query = useSearchParams();
  const view = useMemo(() => lotViewSchema.parse(Object.fromEntries(query)), [query]);
  const change = useCallback(
    (to: Partial<LotView>) => {
      // The address itself is the newest: two changes may come before the page is drawn again.
      const now = lotViewSchema.parse(Object.fromEntries(new URLSearchParams(window.location.search)));
      const next = lotViewQuery({ ...now, ...to });
      window.history.pushState(null, '', next ? `${path}?${next}` : path);
    },
    [path],
  );
  return [view, change];
}
