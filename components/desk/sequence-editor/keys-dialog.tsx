'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';

const keys = [
  ['Enter, Shift Enter', 'next or previous field'],
  ['Ctrl Z, Ctrl Shift Z', 'undo, redo, across the whole draft'],
  ['Alt ↑, Alt ↓', 'move the step'],
  ['Alt N', 'add a step after it'],
  ['Alt C', 'duplicate the step'],
  ['Alt O', 'switch the step on or off'],
  ['Alt Delete', 'remove the step'],
  ['F2', 'name the step'],
  ['Alt J', 'go to the next error'],
  ['?', 'this list'],
] as const;

export function KeysDialog({ open, onClose }: { open: boolean; onClose: () => void }) {
  return (
    <Dialog
      open={open}
      onOpenChange={(next) => !next && onClose()}
      title="Keys of the editor"
      actions={
        <Button kind="filled" data-safe="" onClick={onClose}>
          Close
        </Button>
      }
    >
      <dl className="grid grid-cols-[auto_1fr] gap-x-6 gap-y-1.5">
        {keys.map(([key, act]) => (
          <div key={key} className="contents">
            <dt className="font-num font-bold">{key}</dt>
            <dd>{act}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}
