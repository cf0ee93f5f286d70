'use client';

import { useRouter } from 'next/navigation';
import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';

/** Asks before the page is left with text that is not saved. The text stays in this browser either way. */
export function LeaveGuard({ unsaved }: { unsaved: boolean }) {
  const router = useRouter();
  const [leavingTo, setLeavingTo] = useState<string | null>(null);
  useEffect(() => {
    if (!unsaved) return;
    const unload = (event: BeforeUnloadEvent) => event.preventDefault();
    const click = (event: MouseEvent) => {
      const link = event.target instanceof Element ? event.target.closest('a[href]') : null;
      const elsewhere = event.ctrlKey || event.metaKey || event.shiftKey || event.button !== 0;
      if (!(link instanceof HTMLAnchorElement) || elsewhere || link.target === '_blank') return;
      if (link.origin !== location.origin || link.pathname === location.pathname) return;
      event.preventDefault();
      event.stopPropagation();
      setLeavingTo(link.pathname + link.search);
    };
    window.addEventListener('beforeunload', unload);
    document.addEventListener('click', click, true);
    return () => {
      window.removeEventListener('beforeunload', unload);
      document.removeEventListener('click', click, true);
    };
  }, [unsaved]);
  return (
    <Dialog
      open={leavingTo !== null}
      onOpenChange={(open) => !open && setLeavingTo(null)}
      title="Leave with text that is not saved?"
      consequence="It is kept in this browser and comes back when you open this draft here again. Nobody else sees it until then."
      actions={
        <>
          <Button kind="filled" data-safe="" onClick={() => setLeavingTo(null)}>
            Stay here
          </Button>
          <Button onClick={() => leavingTo && router.push(leavingTo)}>Leave the page</Button>
        </>
      }
    />
  );
}
