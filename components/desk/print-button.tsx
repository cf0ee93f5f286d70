'use client';

import { Button } from '@/components/ui/button';

/** Opens the browser's print dialog. */
export function PrintButton({ children, kind = 'filled' }: { children: string; kind?: 'filled' | 'outlined' }) {
  return (
    <Button kind={kind} className="sw-screen-only" onClick={() => window.print()}>
      {children}
    </Button>
  );
}
