'use client';

import { useState } from 'react';
import { ReasonDialog } from '@/components/desk/reason-dialog';
import { Button } from '@/components/ui/button';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';

interface StationStateButtonProps {
  code: string;
  retired: boolean;
  act: (input: unknown) => Promise<Outcome>;
}

/** Takes a station out of use, or back into it, with a reason. */
export function StationStateButton({ code, retired, act }: StationStateButtonProps) {
  const [open, setOpen] = useState(false);
  const toast = useToast();
  return (
    <>
      <Button onClick={() => setOpen(true)}>{retired ? 'Take back into use…' : 'Take out of use…'}</Button>
      <ReasonDialog
        open={open}
        onClose={() => setOpen(false)}
        title={retired ? `Take ${code} back into use?` : `Take ${code} out of use?`}
        consequence={
          retired
            ? 'Its bench opens the instruments again.'
            : 'Whoever is signed in there is signed out, and no run starts. Its records stay.'
        }
        verb={retired ? 'Take back into use' : 'Take out of use'}
        keep="Leave it as it is"
        send={(reason) => act({ code, reason })}
        onDone={() => {
          setOpen(false);
          toast(retired ? `${code} is in use` : `${code} is out of use`);
        }}
      />
    </>
  );
}
