'use client';

import { useEffect, useState } from 'react';

/**
 * Stops links while something is not saved: the address that was asked for, until `stay` or `leave`. Closing the tab is asked
 * about by the browser itself.
 */
export function useLeaveGuard(unsaved: boolean) {
  const [address, setAddress] = useState<string | null>(null);
  useEffect(() => {
    if (!unsaved) return;
    const onUnload = (event: BeforeUnloadEvent) => event.preventDefault();
    const onClick = (event: MouseEvent) => {
      const link = (event.target as Element | null)?.closest?.('a[href]');
      if (!(link instanceof HTMLAnchorElement) || link.target || event.ctrlKey || event.metaKey || event.button !== 0)
        return;
      const to = new URL(link.href);
      if (to.origin === location.origin && to.pathname === location.pathname) return;
      event.preventDefault();
      event.stopPropagation();
      setAddress(link.href);
    };
    window.addEventListener('beforeunload', onUnload);
    document.addEventListener('click', onClick, { capture: true });
    return () => {
      window.removeEventListener('beforeunload', onUnload);
      document.removeEventListener('click', onClick, { capture: true });
    };
  }, [unsaved]);
  return { address, stay: () => setAddress(null) };
}
