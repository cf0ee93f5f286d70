'use client';

import { useState } from 'react';
import { ReasonDialog } from '@/components/desk/reason-dialog';
import { Button } from '@/components/ui/button';
import { useToast } from '@/components/ui/toast';
import type { Outcome } from '@/lib/contracts/outcome';

interface AccountStateButtonProps {
  accountId: string;
  name: string;
  closed: boolean;
  /** One's own account stays open. */
  own: boolean;
  act: (input: unknown) => Promise<Outcome>;
}

/** Closes an account, or opens it again, with a reason. */
export function AccountStateButton({ accountId, name, closed, own, act }: AccountStateButtonProps) {
  const [open, setOpen] = useState(false);
  const toast = useToast();
  return (
    <>
      <Button unavailable={own ? 'another administrator can close your account' : null} onClick={() => setOpen(true)}>
        {closed ? 'Open the account…' : 'Close the account…'}
      </Button>
      <ReasonDialog
        open={open}
        onClose={() => setOpen(false)}
        title={closed ? `Open the account of ${name}?` : `Close the account of ${name}?`}
        consequence={
          closed
            ? 'Badge, PIN and password work as before.'
            : 'Open pages and bench sessions end within seconds. Records made before stay valid.'
        }
        verb={closed ? 'Open the account' : 'Close the account'}
        keep="Leave it as it is"
        send={(reason) => act({ accountId, reason })}
        onDone={() => {
          setOpen(false);
          toast(closed ? `${name} may sign in again` : `The account of ${name} is closed`);
        }}
      />
    </>
  );
}
