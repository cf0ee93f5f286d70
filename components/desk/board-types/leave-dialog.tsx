'use client';

import { useRouter } from 'next/navigation';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { useLeaveGuard } from './use-leave-guard';

/** Asks before a link leaves what is not saved. */
export function LeaveDialog({ unsaved }: { unsaved: boolean }) {
  const router = useRouter();
  const { address, stay } = useLeaveGuard(unsaved);
  if (!address) return null;
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && stay()}
      title="Leave without saving the draft?"
      consequence="What you typed stays in this tab and is shown again when you come back. Nobody else sees it until it is saved."
      actions={
        <>
          <Button data-safe onClick={stay}>
            Stay here
          </Button>
          <Button
            kind="link"
            onClick={() => {
              stay();
              router.push(address);
            }}
          >
            Leave without saving
          </Button>
        </>
      }
    />
  );
}
