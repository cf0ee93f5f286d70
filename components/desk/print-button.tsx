'use client';

import { Button } from '@/components/ui/button';

/** Opens the browser's print dialog. */
export function PrintButton({ children }: { children: string }) {
  return (
    <Button kind="filled" className="sw-screen-only" onClick={() => window.print()}>
      {children}
    </Button>
  );
}
